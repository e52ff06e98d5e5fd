import type { PersonHere } from '@/shared/api/live';

/** Who looks at which layout, one entry for each socket; never stored. */
export class PeopleHere {
  private readonly layouts = new Map<string, Map<string, PersonHere>>();

  /** Everybody who looks at a layout, in the order they came. */
  list(layoutId: string): readonly PersonHere[] {
    return [...(this.layouts.get(layoutId)?.values() ?? [])];
  }

  /** Puts somebody down, or what they point at now. */
  put(layoutId: string, person: PersonHere): void {
    const people = this.layouts.get(layoutId) ?? new Map<string, PersonHere>();
    this.layouts.set(layoutId, people);
    people.set(person.socketId, person);
  }

  /** Somebody's entry, if they look at this layout. */
  find(layoutId: string, socketId: string): PersonHere | undefined {
    return this.layouts.get(layoutId)?.get(socketId);
  }

  /** Takes somebody out; false when they were not there. */
  remove(layoutId: string, socketId: string): boolean {
    const people = this.layouts.get(layoutId);
    const removed = people?.delete(socketId) ?? false;
    if (people?.size === 0) this.layouts.delete(layoutId);
    return removed;
  }
}
