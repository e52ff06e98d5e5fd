import type { NudgeMessage, PersonHere } from '@/shared/api/live';
import type { LayoutDocument } from '@/shared/layout/document';
import type { CommittedOperation } from '@/shared/layout/operation';
import type { EditorClock } from './editor-clock';
import type { OthersNudge } from './editor-snapshot';

/** A nudge that is not repeated for this long is over, whatever became of its end: volatile messages get lost. */
const NUDGE_LIFE = 4000;
/** After the drop the place holds until the operation is here, at most this long. */
const DROP_LIFE = 2000;

type LiveNudge = {
  readonly antennas: NudgeMessage['antennas'];
  readonly memberId: string;
  readonly forget: () => void;
  readonly isDropped: boolean;
};

/** Who looks at the layout now, and what is under their fingers. Nothing of it is stored. */
export class HereNow {
  people: readonly PersonHere[] = [];
  private nudgesBySocket = new Map<string, LiveNudge>();

  constructor(
    private readonly clock: EditorClock,
    private readonly onChange: () => void,
  ) {}

  arrive(people: readonly PersonHere[]): void {
    this.people = people;
    const sockets = new Set(people.map((person) => person.socketId));
    for (const socketId of [...this.nudgesBySocket.keys()]) if (!sockets.has(socketId)) this.end(socketId);
    this.onChange();
  }

  /** A person moved their crosshair or selected something. */
  update(person: PersonHere): void {
    const isKnown = this.people.some(({ socketId }) => socketId === person.socketId);
    this.people = isKnown
      ? this.people.map((one) => (one.socketId === person.socketId ? person : one))
      : [...this.people, person];
    this.onChange();
  }

  /** The line is lost: nobody is known to be here. */
  clear(): void {
    for (const socketId of [...this.nudgesBySocket.keys()]) this.end(socketId);
    this.people = [];
  }

  nudge(socketId: string, memberId: string, { antennas, done }: NudgeMessage): void {
    this.end(socketId);
    if (antennas.length > 0) {
      const forget = this.clock.after(done ? DROP_LIFE : NUDGE_LIFE, () => {
        this.end(socketId);
        this.onChange();
      });
      this.nudgesBySocket.set(socketId, { antennas, memberId, forget, isDropped: done });
    }
    this.onChange();
  }

  /** A drop that was committed needs its nudge no longer. */
  settle(committed: readonly CommittedOperation[]): void {
    for (const { operation, memberId } of committed) {
      for (const [socketId, nudge] of [...this.nudgesBySocket]) {
        const touches = operation.changes.some((change) => {
          if (change.kind === 'set-platform' || change.collection !== 'antennas') return false;
          const id = change.kind === 'add' ? change.value.id : change.id;
          return nudge.antennas.some((antenna) => antenna.id === id);
        });
        if (touches && (nudge.isDropped || nudge.memberId === memberId)) this.end(socketId);
      }
    }
  }

  /** Everything under others' fingers, each with the name of whose finger it is. */
  nudges(document: LayoutDocument): OthersNudge[] {
    return [...this.nudgesBySocket].flatMap(([socketId, { antennas }]) => {
      const person = this.people.find((one) => one.socketId === socketId);
      return antennas.map((antenna) => {
        const standing = Object.hasOwn(document.antennas, antenna.id) ? document.antennas[antenna.id] : null;
        return {
          antennaId: antenna.id,
          x: antenna.x,
          y: antenna.y,
          label: standing?.label ?? antenna.label ?? '',
          socketId,
          name: person?.name ?? 'Somebody',
          initials: person?.initials ?? '?',
          inDocument: standing !== null && standing !== undefined,
        };
      });
    });
  }

  private end(socketId: string): void {
    this.nudgesBySocket.get(socketId)?.forget();
    this.nudgesBySocket.delete(socketId);
  }
}
