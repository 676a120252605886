'use client';

import { useEffect, useState, type ReactNode } from 'react';

type QuietReminderProps = {
  /** ISO 8601: when to say it; the server's clock and the browser's may differ by a little. */
  at: string;
  /** Milliseconds by which the server's clock was ahead when the page was made, told by the time it was served. */
  servedAt: string;
  children: ReactNode;
};

/** Says one line once, two minutes before the end. Nothing ticks; a page that is opened later shows it at once. */
export function QuietReminder({ at, servedAt, children }: QuietReminderProps) {
  const [isDue, setDue] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setDue(true), Math.max(0, Date.parse(at) - Date.parse(servedAt)));
    return () => clearTimeout(timer);
  }, [at, servedAt]);
  return (
    <div role="status" aria-live="polite">
      {isDue ? children : null}
    </div>
  );
}
