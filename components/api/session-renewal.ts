/** Asks the person to sign in again, in place; true once they did as the same person. */
export type RenewSession = () => Promise<boolean>;

let renew: RenewSession | null = null;

/** Who asks while somebody is signed in (the session provider); null when nobody is. */
export function setSessionRenewal(ask: RenewSession | null): void {
  renew = ask;
}

/** Called when the server no longer knows the session. */
export function renewSession(): Promise<boolean> {
  return renew ? renew() : Promise.resolve(false);
}
