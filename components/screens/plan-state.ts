import { useEffect, useMemo, useRef, useState, type RefObject } from 'react';
import { useComments } from '@/components/api/use-comments';
import { useRevisions } from '@/components/api/use-revisions';
import type { PlanCanvasHandle } from '@/components/canvas/plan-canvas';
import { useEditor } from '@/components/canvas/use-editor';
import type { LayoutEditor } from '@/components/editor/layout-editor';
import type { LabelOf } from '@/components/panels/estimate-words';
import { FIRST_NUMBER } from '@/components/panels/antenna-numbers';
import type { PairKey } from '@/components/panels/pair-list';
import { orderRevisions } from '@/components/panels/revision-words';
import { usePreferences, type Preferences } from '@/components/theme/preferences';
import type { Comment, CommentTarget } from '@/shared/api/comments';
import type { Layout } from '@/shared/api/layouts';
import { usePlanEditor } from './use-plan-editor';

/** What can be open beside the plan; which of them stand together depends on the room there is. */
export type PlanPart = 'results' | 'shelf' | 'antenna' | 'comments' | 'revisions';

/** An open plan: its editor, and what is chosen and open on its screen. */
export type Plan = {
  readonly layout: Layout;
  readonly editor: LayoutEditor;
  readonly canvas: RefObject<PlanCanvasHandle | null>;
  readonly unit: Preferences['lengthUnit'];
  readonly labelOf: LabelOf;
  readonly comments: readonly Comment[];
  readonly openComments: number;
  /** "after B", or what stands there before the first revision. */
  readonly state: string;
  readonly canComment: boolean;
  readonly part: PlanPart;
  readonly show: (part: PlanPart) => void;
  readonly chosenPair: PairKey | null;
  readonly choosePair: (pair: PairKey | null) => void;
  readonly chosenComment: string | null;
  readonly chooseComment: (commentId: string | null) => void;
  readonly commentTarget: CommentTarget | null;
  readonly aimComment: (target: CommentTarget | null) => void;
  readonly editNumbers: () => void;
};

/** The state of an open plan's screen. */
export function usePlan(layout: Layout): Plan {
  const editor = usePlanEditor(layout);
  const canvas = useRef<PlanCanvasHandle>(null);
  const { lengthUnit } = usePreferences();
  const comments = useComments({ kind: 'layout', layoutId: layout.id }).data?.items ?? NO_COMMENTS;
  const revisions = useRevisions(layout.id).data?.items;
  const antennas = useEditor(editor, (snapshot) => snapshot.document?.antennas);
  const abilities = useEditor(editor, (snapshot) => snapshot.abilities);
  const [part, show] = useState<PlanPart>('results');
  const [chosenPair, setChosenPair] = useState<PairKey | null>(null);
  const [chosenComment, setChosenComment] = useState<string | null>(null);
  const [commentTarget, setCommentTarget] = useState<CommentTarget | null>(null);
  const [wantsNumbers, setWantsNumbers] = useState(0);

  useEffect(() => {
    if (wantsNumbers > 0) document.querySelector<HTMLElement>(`[data-testid="${FIRST_NUMBER}"]`)?.focus();
  }, [wantsNumbers]);

  const labelOf = useMemo<LabelOf>(() => (id) => antennas?.[id]?.label ?? '?', [antennas]);
  const last = revisions ? orderRevisions(revisions)[0] : undefined;
  const lastLetter = revisions ? (last?.letter ?? null) : layout.lastLetter;
  return {
    layout,
    editor,
    canvas,
    unit: lengthUnit,
    labelOf,
    comments,
    openComments: comments.filter(({ resolvedAt }) => resolvedAt === null).length,
    state: lastLetter === null ? 'no revision yet' : `after ${lastLetter}`,
    canComment: (abilities ?? layout.abilities).comment,
    part,
    show,
    chosenPair,
    choosePair: (pair) => {
      setChosenPair(pair);
      if (pair) show('results');
    },
    chosenComment,
    chooseComment: (commentId) => {
      setChosenComment(commentId);
      if (commentId !== null) show('comments');
    },
    commentTarget,
    aimComment: (target) => {
      setCommentTarget(target);
      if (target !== null) {
        setChosenComment(null);
        show('comments');
      }
    },
    editNumbers: () => {
      show('antenna');
      setWantsNumbers((count) => count + 1);
    },
  };
}

const NO_COMMENTS: readonly Comment[] = [];
