const MOMENT = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  hour: '2-digit',
  minute: '2-digit',
});
const SHEET = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  hour: '2-digit',
  minute: '2-digit',
  timeZone: 'UTC',
  timeZoneName: 'short',
});

/** A moment in the reader's own time: "4 Mar 2031, 09:15". */
export function momentText(iso: string): string {
  return MOMENT.format(new Date(iso));
}

/** A moment as it stands on a sheet that is read anywhere: in UTC, and it says so. */
export function sheetMomentText(iso: string): string {
  return SHEET.format(new Date(iso));
}
