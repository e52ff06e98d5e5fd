import { useDeferredValue, useState } from 'react';
import { View } from 'react-native';
import { useCalmEditor } from '@/components/canvas/use-calm-editor';
import { useEditor } from '@/components/canvas/use-editor';
import { AntennaList } from '@/components/panels/antenna-list';
import { AntennaNumbers } from '@/components/panels/antenna-numbers';
import { CommentsPanel } from '@/components/panels/comments-panel';
import { CoordinatesTable } from '@/components/panels/coordinates-table';
import { PatternPanel } from '@/components/panels/pattern-panel';
import { ResultsPanel } from '@/components/panels/results-panel';
import { RevisionsPanel } from '@/components/panels/revisions-panel';
import { ShelfPanel } from '@/components/panels/shelf-panel';
import { space } from '@/components/theme/tokens';
import { Dialog } from '@/components/ui/dialog';
import { LoadingState } from '@/components/ui/states';
import { assertNever } from '@/shared/errors';
import type { Plan, PlanPart } from './plan-state';

type PlanPartViewProps = {
  readonly plan: Plan;
  readonly part: PlanPart;
  /** Called when something of this part goes on on the plan: a phone makes room for it. */
  readonly onPlan?: () => void;
};

/** One of the parts beside the plan. */
export function PlanPartView({ plan, part, onPlan }: PlanPartViewProps) {
  switch (part) {
    case 'results':
      return <Results plan={plan} />;
    case 'shelf':
      return <Shelf plan={plan} onPlan={onPlan} />;
    case 'antenna':
      return <Antennas plan={plan} onPlan={onPlan} />;
    case 'comments':
      return <Comments plan={plan} onPlan={onPlan} />;
    case 'revisions':
      return <Revisions plan={plan} />;
    default:
      return assertNever(part);
  }
}

/** The panels follow the finger a little later than the plan does: the plan comes first in every frame. */
function useResults({ editor }: Plan) {
  const snapshot = useDeferredValue(useCalmEditor(editor, (whole) => whole));
  return snapshot.painted && snapshot.estimate
    ? { document: snapshot.painted, estimate: snapshot.estimate, snapshot }
    : null;
}

function Results({ plan }: { readonly plan: Plan }) {
  const results = useResults(plan);
  if (!results) return <LoadingState label="Opening the layout" />;
  const { document, estimate, snapshot } = results;
  const chosen = snapshot.gesture?.id ?? snapshot.selection[0] ?? null;
  return (
    <View style={{ gap: space.l }}>
      <ResultsPanel
        document={document}
        estimate={estimate}
        agreement={snapshot.agreement}
        labelOf={plan.labelOf}
        chosenAntenna={chosen}
        chosenPair={plan.chosenPair}
        onChoosePair={plan.choosePair}
        rows={6}
      />
      <PatternPanel
        antenna={chosen === null ? null : (document.antennas[chosen] ?? null)}
        result={chosen === null ? null : (estimate.antennas[chosen] ?? null)}
        forwardAxis={document.platform.forwardAxis}
        turn="up"
      />
    </View>
  );
}

function Shelf({ plan: { editor, canvas }, onPlan }: Omit<PlanPartViewProps, 'part'>) {
  const canEdit = useEditor(editor, (snapshot) => snapshot.canEdit);
  return (
    <ShelfPanel
      canEdit={canEdit}
      onPull={(part, pointer) => {
        onPlan?.();
        canvas.current?.startPlacing(part, pointer);
      }}
      onPlace={(part) => {
        editor.place(part);
        onPlan?.();
      }}
    />
  );
}

function Antennas({ plan, onPlan }: Omit<PlanPartViewProps, 'part'>) {
  const { editor, unit, canvas } = plan;
  const document = useEditor(editor, (snapshot) => snapshot.document);
  const selection = useEditor(editor, (snapshot) => snapshot.selection);
  const canEdit = useEditor(editor, (snapshot) => snapshot.canEdit);
  const [asTable, setAsTable] = useState(false);
  if (!document) return <LoadingState label="Opening the layout" />;
  const antenna = selection[0] === undefined ? undefined : document.antennas[selection[0]];
  return (
    <View style={{ gap: space.l }}>
      {antenna ? (
        <AntennaNumbers
          editor={editor}
          document={document}
          antenna={antenna}
          unit={unit}
          canEdit={canEdit}
          onComment={
            plan.canComment
              ? () => plan.aimComment({ kind: 'antenna', antennaId: antenna.id, label: antenna.label })
              : null
          }
        />
      ) : null}
      <AntennaList
        document={document}
        selection={selection}
        unit={unit}
        onSelect={(id) => {
          editor.select([id]);
          canvas.current?.focusAntenna(id);
          onPlan?.();
        }}
        onTable={() => setAsTable(true)}
      />
      <Dialog open={asTable} title="Coordinates from the datum" large onClose={() => setAsTable(false)}>
        <Coordinates plan={plan} />
      </Dialog>
    </View>
  );
}

function Coordinates({ plan: { editor, unit } }: { readonly plan: Plan }) {
  const document = useEditor(editor, (snapshot) => snapshot.document);
  const estimate = useEditor(editor, (snapshot) => snapshot.estimate);
  const canEdit = useEditor(editor, (snapshot) => snapshot.canEdit);
  if (!document) return null;
  return (
    <CoordinatesTable editor={editor} document={document} estimate={estimate} unit={unit} canEdit={canEdit} />
  );
}

function Comments({ plan, onPlan }: Omit<PlanPartViewProps, 'part'>) {
  const document = useEditor(plan.editor, (snapshot) => snapshot.document);
  return (
    <CommentsPanel
      subject={{ kind: 'layout', layoutId: plan.layout.id }}
      document={document}
      canComment={plan.canComment}
      selectedId={plan.chosenComment}
      onSelect={plan.chooseComment}
      target={plan.commentTarget}
      onTargetChange={plan.aimComment}
      onPickSpot={() => {
        onPlan?.();
        plan.canvas.current?.startCommenting();
      }}
    />
  );
}

function Revisions({ plan: { layout, editor } }: { readonly plan: Plan }) {
  const sequence = useEditor(editor, (snapshot) => snapshot.sequence);
  const pendingCount = useEditor(editor, (snapshot) => snapshot.pendingCount);
  const abilities = useEditor(editor, (snapshot) => snapshot.abilities);
  return (
    <RevisionsPanel
      layoutId={layout.id}
      sequence={sequence}
      pendingCount={pendingCount}
      abilities={abilities}
    />
  );
}
