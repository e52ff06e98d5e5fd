import { useDeferredValue, useMemo, useState } from 'react';
import { View } from 'react-native';
import { PlanCanvas } from '@/components/canvas/plan-canvas';
import { useEditor } from '@/components/canvas/use-editor';
import type { Insets, Size } from '@/components/canvas/viewport';
import type { ScreenBox } from '@/components/canvas/label-placement';
import { PlanReadout } from '@/components/panels/plan-readout';
import { TitleBlock } from '@/components/panels/title-block';
import { space, target } from '@/components/theme/tokens';
import { PlanNotices } from './plan-notices';
import type { Plan } from './plan-state';
import { PlanTools } from './plan-tools';

type PlanViewProps = {
  readonly plan: Plan;
  /** What covers the lower edge, px: a phone's sheet. */
  readonly coveredBelow?: number;
  readonly narrow?: boolean;
};

/** Height of the readout, in one line or on a phone two, and how many tools there are, px. */
const READOUT_HEIGHT = { wide: 38, narrow: 58 } as const;
const TOOLS = 5;
/** What title block with three people and tools take above the drawing's own margin, px. */
const ROOM_BELOW = 130;
/** Width of the plan from which the distances to two neighbours fit on one line, px. */
const ROOM_FOR_TWO = 760;

/** The drawing with what lies over it: readout, title block, tools, notices. */
export function PlanView({ plan, coveredBelow = 0, narrow = false }: PlanViewProps) {
  const { canvas } = plan;
  const [size, setSize] = useState<Size>({ width: 0, height: 0 });
  const [block, setBlock] = useState<Size>({ width: 0, height: 0 });
  const foot = coveredBelow + space.m;
  const readout = READOUT_HEIGHT[narrow ? 'narrow' : 'wide'] + space.m;
  // on a phone the drawing leaves the tools' column free
  const right = narrow ? target.min + space.s : 0;
  const cover = useMemo<Insets>(
    () => ({ top: readout, right, bottom: coveredBelow, left: 0 }),
    [readout, right, coveredBelow],
  );
  const covered = useMemo<readonly ScreenBox[]>(() => {
    const toolsLength = TOOLS * (target.min + space.s);
    const tools = narrow
      ? { width: target.min + space.m, height: toolsLength }
      : { width: toolsLength, height: target.min };
    const boxes = [
      { left: 0, top: 0, width: size.width, height: readout },
      {
        left: size.width - tools.width - space.m,
        top: size.height - foot - tools.height,
        ...tools,
      },
    ];
    if (!narrow) {
      boxes.push({
        left: size.width - block.width - space.m,
        top: size.height - foot - tools.height - space.s - block.height,
        width: block.width,
        height: block.height,
      });
    }
    return boxes;
  }, [size, block, narrow, foot, readout]);
  return (
    <View
      role="main"
      style={{ flex: 1 }}
      onLayout={({ nativeEvent: { layout } }) => setSize({ width: layout.width, height: layout.height })}
    >
      <PlanCanvas
        ref={canvas}
        editor={plan.editor}
        comments={plan.comments}
        chosenComment={plan.chosenComment}
        chosenPair={plan.chosenPair}
        unit={plan.unit}
        cover={cover}
        covered={covered}
        roomBelow={narrow ? 0 : ROOM_BELOW}
        onChooseComment={plan.chooseComment}
        onChoosePair={plan.choosePair}
        onCommentAt={plan.aimComment}
        onEditNumbers={plan.editNumbers}
      />
      <View
        style={{ position: 'absolute', top: space.m, left: space.m, right: space.m, pointerEvents: 'none' }}
      >
        <View style={{ alignSelf: 'flex-start' }}>
          <Readout plan={plan} neighbours={size.width < ROOM_FOR_TWO ? 1 : 2} />
        </View>
      </View>
      <View
        style={{
          position: 'absolute',
          right: space.m,
          bottom: foot,
          gap: space.s,
          alignItems: 'flex-end',
          pointerEvents: 'box-none',
        }}
      >
        {narrow ? null : <Block plan={plan} onSize={(width, height) => setBlock({ width, height })} />}
        <PlanTools plan={plan} column={narrow} />
      </View>
      <PlanNotices plan={plan} />
    </View>
  );
}

function Readout({ plan, neighbours }: { readonly plan: Plan; readonly neighbours: number }) {
  const snapshot = useDeferredValue(useEditor(plan.editor, (whole) => whole));
  return <PlanReadout snapshot={snapshot} unit={plan.unit} labelOf={plan.labelOf} neighbours={neighbours} />;
}

type BlockProps = { readonly plan: Plan; readonly onSize: (width: number, height: number) => void };

function Block({ plan: { editor, layout, state }, onSize }: BlockProps) {
  const people = useEditor(editor, (snapshot) => snapshot.people);
  const socketId = useEditor(editor, (snapshot) => snapshot.socketId);
  return (
    <TitleBlock
      title={`${layout.job.name}, ${layout.platform.name}`}
      state={state}
      people={people}
      mySocketId={socketId}
      onSize={onSize}
    />
  );
}
