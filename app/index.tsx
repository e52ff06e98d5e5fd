/** Everybody is sent on from here: the signed out to the sign-in, the others to where they begin. */
export default function Index() {
  return null;
}
