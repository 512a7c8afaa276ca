import { useEffect, useRef } from 'react';
import classes from './error-summary.module.css';

interface Props {
  /** Messages by dotted path; the input of a path carries `id={idOf(path)}`. */
  messages: Record<string, string>;
  idOf: (path: string) => string;
}

/** What keeps a form from being saved, each line leading to its input. Takes focus when it appears. */
export function ErrorSummary({ messages, idOf }: Props) {
  const box = useRef<HTMLDivElement>(null);
  const entries = Object.entries(messages);
  const shown = entries.map(([path, message]) => path + message).join('|');
  useEffect(() => {
    if (shown) box.current?.focus();
  }, [shown]);
  if (entries.length === 0) return null;
  return (
    <div ref={box} tabIndex={-1} role="alert" className={classes.summary}>
      <strong>
        {entries.length === 1
          ? 'One thing is missing or not right'
          : `${entries.length} things are missing or not right`}
      </strong>
      <ul>
        {entries.map(([path, message]) => (
          <li key={path}>
            <a
              href={`#${idOf(path)}`}
              onClick={(event) => {
                event.preventDefault();
                document.getElementById(idOf(path))?.focus();
              }}
            >
              {message}
            </a>
          </li>
        ))}
      </ul>
    </div>
  );
}
