const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric' });
const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });

/** "3 March 2031", in the time of this machine. */
export const dayText = (isoTime: string): string => day.format(new Date(isoTime));

/** "14:06", in the time of this machine. */
export const clockText = (isoTime: string): string => clock.format(new Date(isoTime));

/** "3 March 2031, 14:06", in the time of this machine. */
export const timeText = (isoTime: string): string => `${dayText(isoTime)}, ${clockText(isoTime)}`;
