/** The calendar day (ISO 8601) in a time zone at an instant; by default the device's. */
export const todayIn = (timeZone?: string, instant = new Date()): string =>
  new Intl.DateTimeFormat('en-CA', {
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    ...(timeZone ? { timeZone } : {}),
  }).format(instant);

/** "Mon 9 Mar, 16:20" on the device's clock. */
export const shortInstant = (iso: string): string => {
  const date = new Date(iso);
  const day = new Intl.DateTimeFormat('en-GB', { weekday: 'short', day: 'numeric', month: 'short' }).format(date);
  const time = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' }).format(date);
  return `${day}, ${time}`;
};
