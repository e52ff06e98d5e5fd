import type { IconName } from '@/components/ui/icon';
import type { Session } from '@/shared/api/session';

/** A place of the navigation. */
export type Place = {
  readonly href: '/jobs' | '/frozen' | '/parts' | '/people' | '/mails' | '/account';
  readonly label: string;
  readonly icon: IconName;
};

const ACCOUNT: Place = { href: '/account', label: 'Account', icon: 'account' };

/** Where this member may go, in the order of the navigation. */
export function placesFor({ abilities }: Session): readonly Place[] {
  const places: Place[] = [];
  if (abilities.seeJobs) {
    places.push({ href: '/jobs', label: 'Jobs', icon: 'jobs' });
    places.push({ href: '/parts', label: 'Parts', icon: 'parts' });
  } else places.push({ href: '/frozen', label: 'Frozen', icon: 'lock' });
  places.push({ href: '/people', label: 'People', icon: 'people' });
  if (abilities.seeMails) places.push({ href: '/mails', label: 'Mails', icon: 'mail' });
  return [...places, ACCOUNT];
}

/** Where this member begins. */
export function homeOf(session: Session): '/jobs' | '/frozen' {
  return session.abilities.seeJobs ? '/jobs' : '/frozen';
}

// A second slash (or what browsers take for one) would begin another server's address; a control character is
// dropped by them and could hide one.
const PATH = /^\/(?![/\\])[^\\\s]*$/;

/** The place within this product that an address means; null when it leads out of it. */
export function placeWithin(address: string | undefined): string | null {
  const { origin } = globalThis.location;
  const path = address?.startsWith(`${origin}/`) ? address.slice(origin.length) : address;
  return path !== undefined && PATH.test(path) ? path : null;
}
