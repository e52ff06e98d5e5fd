import type { Refusal } from '@/shared/errors';
import type { Change } from '@/shared/layout/operation';
import type { Notice, NoticeKind } from './editor-snapshot';

/** More than these nobody reads; the oldest go. */
const NOTICES_KEPT = 8;

/** What the member has to know, newest last; the same sentence is not said twice. */
export class NoticeBoard {
  notices: readonly Notice[] = [];
  private lastId = 0;

  add(kind: NoticeKind, message: string, refusal?: Refusal, changes: readonly Change[] | null = null): void {
    this.lastId += 1;
    const notice: Notice = {
      id: this.lastId,
      kind,
      message,
      code: refusal?.code ?? null,
      problems: refusal?.problems ?? [],
      changes,
    };
    const others = this.notices.filter((one) => one.kind !== kind || one.message !== message);
    this.notices = [...others, notice].slice(-NOTICES_KEPT);
  }

  dismiss(noticeId: number): void {
    this.notices = this.notices.filter(({ id }) => id !== noticeId);
  }
}
