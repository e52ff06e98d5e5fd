import {
  useEffect,
  useImperativeHandle,
  useMemo,
  useRef,
  useState,
  useSyncExternalStore,
  type Ref,
} from 'react';
import { View } from 'react-native';
import Svg from 'react-native-svg';
import { gridStep, keyCommand, keyMove } from '@/components/editor/key-commands';
import type { ShelfPart } from '@/components/editor/editor-snapshot';
import type { LayoutEditor } from '@/components/editor/layout-editor';
import { drawing } from '@/components/theme/drawing';
import { useTheme } from '@/components/theme/use-theme';
import { webAttributes, webStyle, type KeyPress } from '@/components/ui/web-attributes';
import type { Comment, CommentTarget } from '@/shared/api/comments';
import { boxAround } from '@/shared/geometry/box';
import { assertNever } from '@/shared/errors';
import { AntennaTargets, antennaTargetId } from './antenna-targets';
import { GestureSurface, type PointerSource } from './gesture-surface';
import { GridLayer } from './grid-layer';
import { hitTarget, type Target } from './hit-test';
import type { ScreenBox } from './label-placement';
import { chosenAntenna, MovingLayers } from './moving-layers';
import { drawPlatform } from './platform-drawing';
import { PlatformLayer } from './platform-layer';
import { RefusalNote } from './refusal-note';
import type { LengthUnit } from './round-length';
import { ScaleBar } from './scale-bar';
import { createSceneKeeper } from './scene-keeper';
import { cursorOf } from './tools/next-tool';
import type { ToolContext, ToolName } from './tools/tool';
import { useEditor } from './use-editor';
import { createViewStore } from './view-store';
import { toPlan, type Insets, type Size } from './viewport';

/** What others of the screen may ask of the canvas. */
export type PlanCanvasHandle = {
  fit(): void;
  turn(): void;
  zoomBy(factor: number): void;
  /** A part from the shelf under a pointer that is down. */
  startPlacing(part: ShelfPart, pointer: PointerSource): void;
  /** The next tap names what a comment is about. */
  startCommenting(): void;
  focusAntenna(antennaId: string): void;
};

type PlanCanvasProps = {
  readonly editor: LayoutEditor;
  readonly comments: readonly Comment[];
  readonly chosenComment: string | null;
  readonly chosenPair: { readonly from: string; readonly into: string } | null;
  readonly unit: LengthUnit;
  /** What covers the edges of the canvas: the drawing is fitted to what is left. */
  readonly cover: Insets;
  /** What the drawing further leaves free below when it is fitted: a corner that things lie in, px. */
  readonly roomBelow?: number;
  /** Pieces that lie over the canvas: nothing is written under them. */
  readonly covered: readonly ScreenBox[];
  readonly onChooseComment: (commentId: string | null) => void;
  readonly onChoosePair: (pair: { readonly from: string; readonly into: string } | null) => void;
  readonly onCommentAt: (target: CommentTarget) => void;
  readonly onEditNumbers: () => void;
  readonly onToolChange?: (tool: ToolName) => void;
  readonly ref?: Ref<PlanCanvasHandle>;
};

/** How near, in pixels, a carried antenna snaps to a line. */
const SNAP_REACH = 8;
/** What one press of a key pans and zooms. */
const KEY_PAN = 48;
const KEY_ZOOM = 1.25;
/** Room that the scale bar takes along the lower edge, px. */
const SCALE_BAR_HEIGHT = 30;

/** The plan: a workshop drawing that can be touched. */
export function PlanCanvas(props: PlanCanvasProps) {
  const { editor, unit, cover, covered, roomBelow = 0, ref } = props;
  const { color } = useTheme();
  const surface = useRef<View>(null);
  const gestures = useRef<GestureSurface | null>(null);
  const [size, setSize] = useState<Size | null>(null);
  const [views] = useState(createViewStore);
  const [keeper] = useState(createSceneKeeper);
  const [tool, setTool] = useState<ToolName>('idle');
  const view = useSyncExternalStore(views.subscribe, views.getView, views.getView);
  const platform = useDrawnPlatform(editor);
  const name = platform?.platform.name ?? 'the platform';

  useEffect(() => {
    if (!platform || !size) return;
    const isNarrow = Math.min(size.width, size.height) < 500;
    const margin = isNarrow ? drawing.margin.phone : drawing.margin.wide;
    const insets = {
      top: cover.top + margin,
      right: cover.right + margin,
      // on a phone the scale bar lies below the width's dimension, not beside it
      bottom: cover.bottom + margin + (isNarrow ? SCALE_BAR_HEIGHT : roomBelow),
      left: cover.left + margin,
    };
    views.setFrame({ box: boxAround(platform.platform.outline), size, insets });
  }, [platform, size, cover, roomBelow, views]);

  const context = makeContext(props, views, keeper);
  const latest = useRef({ context, props });
  useEffect(() => {
    latest.current = { context, props };
  });

  useEffect(() => {
    const element = surface.current as unknown as HTMLElement | null;
    if (!element) return;
    const watched = new ResizeObserver(() => {
      setSize({ width: element.clientWidth, height: element.clientHeight });
    });
    watched.observe(element);
    const own = new GestureSurface({
      element,
      context: () => latest.current.context,
      onToolChange: (state) => {
        element.style.cursor = cursorOf(state);
        setTool(state.name);
        latest.current.props.onToolChange?.(state.name);
      },
      onLeave: () => editor.pointAt(null),
    });
    gestures.current = own;
    const answer = (press: KeyboardEvent) => {
      const { onEditNumbers } = latest.current.props;
      answerKey(press, { editor, views, gestures: own, onEditNumbers });
    };
    element.addEventListener('keydown', answer);
    return () => {
      element.removeEventListener('keydown', answer);
      watched.disconnect();
      own.dispose();
      gestures.current = null;
    };
  }, [editor, views]);

  useImperativeHandle(ref, () => ({
    fit: views.fit,
    turn: views.turn,
    zoomBy: views.zoomMiddle,
    startPlacing(part, pointer) {
      const current = views.getView();
      const element = surface.current as unknown as HTMLElement | null;
      if (!current || !element) return;
      const box = element.getBoundingClientRect();
      const at = toPlan(current, { x: pointer.clientX - box.left, y: pointer.clientY - box.top });
      if (editor.beginDrag(part, at)) gestures.current?.startPlacing(pointer);
    },
    startCommenting: () => gestures.current?.startCommenting(),
    focusAntenna: (id) => document.getElementById(antennaTargetId(id))?.focus({ preventScroll: true }),
  }));

  const drawn = useMemo(
    () => (platform && view ? drawPlatform(platform, view, unit) : null),
    [platform, view, unit],
  );
  const blocked = useMemo(
    () => [...covered, ...(drawn ? [...drawn.texts, ...drawn.dimensions].map(({ box }) => box) : [])],
    [covered, drawn],
  );
  const bounds = useMemo(
    () => ({
      left: cover.left + 4,
      top: cover.top + 4,
      width: (size?.width ?? 0) - cover.left - cover.right - 8,
      height: (size?.height ?? 0) - cover.top - cover.bottom - 8,
    }),
    [size, cover],
  );

  return (
    <View
      ref={surface}
      role="group"
      aria-label={`Plan of ${name}. Tab goes to the antennas; arrows move the chosen one, with Shift by ten steps; Enter edits its numbers; plus and minus zoom, 0 fits.`}
      testID="plan"
      {...webAttributes({
        tabIndex: 0,
        dataSet: { tool },
      })}
      style={[
        webStyle({ touchAction: 'none' }),
        { flex: 1, overflow: 'hidden', backgroundColor: color.ground, userSelect: 'none' },
      ]}
    >
      {size && view && drawn ? (
        <>
          <Svg
            width={size.width}
            height={size.height}
            aria-hidden
            style={{ position: 'absolute', left: 0, top: 0, pointerEvents: 'none' }}
          >
            <GridLayer view={view} size={size} unit={unit} />
            <PlatformLayer drawn={drawn} />
            <ScaleBar
              scale={view.scale}
              unit={unit}
              x={cover.left + 20}
              y={size.height - cover.bottom - 22}
            />
          </Svg>
          {/* a sheet of its own: what stands still is not painted again while something moves over it */}
          <Svg
            width={size.width}
            height={size.height}
            aria-hidden
            style={[
              webStyle({ willChange: 'transform' }),
              { position: 'absolute', left: 0, top: 0, pointerEvents: 'none' },
            ]}
          >
            <MovingLayers
              editor={editor}
              keeper={keeper}
              view={view}
              unit={unit}
              bounds={bounds}
              blocked={blocked}
              comments={props.comments}
              chosenComment={props.chosenComment}
              chosenPair={props.chosenPair}
            />
          </Svg>
          <AntennaTargets editor={editor} view={view} unit={unit} />
          <RefusalNote editor={editor} view={view} size={size} />
        </>
      ) : null}
    </View>
  );
}

/** The fixed part of the document; keeps its identity while only antennas change. */
function useDrawnPlatform(editor: LayoutEditor) {
  const platform = useEditor(editor, (snapshot) => snapshot.painted?.platform ?? null);
  const surfaces = useEditor(editor, (snapshot) => snapshot.painted?.surfaces ?? null);
  const obstacles = useEditor(editor, (snapshot) => snapshot.painted?.obstacles ?? null);
  const keepOuts = useEditor(editor, (snapshot) => snapshot.painted?.keepOuts ?? null);
  const mountPoints = useEditor(editor, (snapshot) => snapshot.painted?.mountPoints ?? null);
  const cableEntries = useEditor(editor, (snapshot) => snapshot.painted?.cableEntries ?? null);
  return useMemo(
    () =>
      platform && surfaces && obstacles && keepOuts && mountPoints && cableEntries
        ? { platform, surfaces, obstacles, keepOuts, mountPoints, cableEntries }
        : null,
    [platform, surfaces, obstacles, keepOuts, mountPoints, cableEntries],
  );
}

type Views = ReturnType<typeof createViewStore>;

function makeContext(
  props: PlanCanvasProps,
  views: Views,
  keeper: ReturnType<typeof createSceneKeeper>,
): ToolContext {
  const { editor } = props;
  const plan = (at: { x: number; y: number }) => {
    const view = views.getView();
    return view ? toPlan(view, at) : { x: 0, y: 0 };
  };
  return {
    get canEdit() {
      return editor.getSnapshot().canEdit;
    },
    hit(pointer) {
      const scene = keeper.current();
      return scene ? hitTarget(scene.hit, pointer.at, pointer.kind) : { kind: 'ground' };
    },
    toPlan: plan,
    pan: views.pan,
    zoom: views.zoom,
    choose: (target) => choose(target, props),
    takeUp: (id, at) => editor.beginDrag(id, at),
    carryTo(at) {
      const scale = views.getView()?.scale ?? 1;
      editor.dragTo(at, { tolerance: SNAP_REACH / scale });
      editor.pointAt(at);
    },
    drop: () => void editor.drop(),
    giveBack: () => editor.cancel(),
    commentAt(target, at) {
      const antenna =
        target.kind === 'antenna' ? editor.getSnapshot().painted?.antennas[target.id] : undefined;
      props.onCommentAt(
        antenna
          ? { kind: 'antenna', antennaId: antenna.id, label: antenna.label }
          : { kind: 'spot', x: at.x, y: at.y },
      );
    },
    showCrosshair: (at) => editor.pointAt(at),
  };
}

function choose(target: Target, props: PlanCanvasProps): void {
  switch (target.kind) {
    case 'antenna':
      props.editor.select([target.id]);
      document.getElementById(antennaTargetId(target.id))?.focus({ preventScroll: true });
      return;
    case 'comment':
      props.onChooseComment(target.id);
      return;
    case 'pair':
      props.onChoosePair({ from: target.from, into: target.into });
      return;
    case 'ground':
      props.editor.select([]);
      props.onChoosePair(null);
      props.onChooseComment(null);
      return;
    default:
      assertNever(target);
  }
}

type KeyAnswer = {
  readonly editor: LayoutEditor;
  readonly views: Views;
  readonly gestures: GestureSurface | null;
  readonly onEditNumbers: () => void;
};

function answerKey(press: KeyPress, { editor, views, gestures, onEditNumbers }: KeyAnswer): void {
  const { key, shiftKey: shift, ctrlKey: control, metaKey: meta, altKey: alt } = press;
  const command = keyCommand({ key, shift, control, meta, alt });
  const handled = command ? answerCommand(command) : answerViewKey();
  if (handled) press.preventDefault();

  function answerCommand(asked: NonNullable<typeof command>): boolean {
    const snapshot = editor.getSnapshot();
    const view = views.getView();
    const hasChoice = chosenAntenna(snapshot) !== null;
    switch (asked.kind) {
      case 'move': {
        if (!hasChoice || !snapshot.canEdit || !snapshot.painted) {
          views.pan(-asked.right * KEY_PAN, asked.up * KEY_PAN);
          return true;
        }
        const { dx, dy } = keyMove(asked, gridStep(snapshot.painted), view?.turn ?? 'right');
        editor.moveSelected(dx, dy);
        return true;
      }
      case 'remove':
        if (hasChoice && snapshot.canEdit) editor.removeSelected();
        return hasChoice;
      case 'cancel':
        if (!gestures?.cancel()) editor.select([]);
        return true;
      case 'edit-numbers':
        if (hasChoice) onEditNumbers();
        return hasChoice;
      case 'undo':
        editor.undo();
        return true;
      case 'redo':
        editor.redo();
        return true;
      default:
        return assertNever(asked);
    }
  }

  function answerViewKey(): boolean {
    if (control || meta || alt) return false;
    if (key === '+' || key === '=') views.zoomMiddle(KEY_ZOOM);
    else if (key === '-') views.zoomMiddle(1 / KEY_ZOOM);
    else if (key === '0') views.fit();
    else return false;
    return true;
  }
}
