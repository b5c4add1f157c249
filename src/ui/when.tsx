import { useEffect, useState } from 'react';

/** A time as people say it, the exact one on hover; it grows older while one looks. */
export function When({ at }: { readonly at: string | number }) {
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), 20_000);
    return () => clearInterval(timer);
  }, []);
  const then = new Date(at);
  return (
    <time dateTime={then.toISOString()} title={sayExactly(then)}>
      {sayAgo(then, new Date(now))}
    </time>
  );
}

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;

export function sayAgo(then: Date, now: Date): string {
  const seconds = (now.getTime() - then.getTime()) / 1000;
  if (seconds < 45) return 'just now';
  if (seconds < 3600) return `${Math.max(1, Math.round(seconds / 60))} min ago`;
  const days = calendarDays(then, now);
  if (seconds < 12 * 3600 || days === 0) return `${Math.round(seconds / 3600)} h ago`;
  if (days === 1) return 'yesterday';
  return sayDay(then, now);
}

/** `27 Nov`, with the year when it is another. */
export function sayDay(then: Date, now: Date): string {
  const day = `${then.getDate()} ${MONTHS[then.getMonth()]!}`;
  return then.getFullYear() === now.getFullYear() ? day : `${day} ${then.getFullYear()}`;
}

export function sayExactly(then: Date): string {
  const two = (n: number) => String(n).padStart(2, '0');
  return `${then.getDate()} ${MONTHS[then.getMonth()]!} ${then.getFullYear()}, ${two(then.getHours())}:${two(then.getMinutes())}:${two(then.getSeconds())}`;
}

function calendarDays(then: Date, now: Date): number {
  const midnight = (date: Date) => new Date(date.getFullYear(), date.getMonth(), date.getDate()).getTime();
  return Math.round((midnight(now) - midnight(then)) / 86_400_000);
}
