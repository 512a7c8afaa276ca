import { Button, Group, SegmentedControl } from '@mantine/core';
import { IconDownload } from '@tabler/icons-react';
import { useId, useRef, useState, type ReactNode } from 'react';
import classes from './picture.module.css';
import { savePicture } from './save-picture';

interface Props {
  title: string;
  /** What the picture says, in one sentence. */
  intro?: ReactNode;
  /** The numbers behind the picture. */
  table: ReactNode;
  /** Address of the numbers as CSV. */
  csvHref?: string;
  /** File name of a saved picture, without ending. */
  fileName: string;
  children: ReactNode;
}

/** A picture with its numbers under it: look, read as a table, save. */
export function Picture({ title, intro, table, csvHref, fileName, children }: Props) {
  const [view, setView] = useState<'picture' | 'table'>('picture');
  const frame = useRef<HTMLDivElement>(null);
  const id = useId();
  return (
    <figure className={classes.figure} aria-labelledby={id}>
      <figcaption className={classes.head}>
        <div>
          <h2 id={id} className={classes.title}>
            {title} <span className={classes.modelled}>modelled</span>
          </h2>
          {intro && <p className={classes.intro}>{intro}</p>}
        </div>
        <Group gap="xs" className="no-print">
          <SegmentedControl
            size="xs"
            value={view}
            onChange={(value) => setView(value === 'table' ? 'table' : 'picture')}
            data={[
              { value: 'picture', label: 'Picture' },
              { value: 'table', label: 'Table' },
            ]}
            aria-label={`${title}: picture or table`}
          />
          {csvHref && (
            <Button
              component="a"
              href={csvHref}
              download
              size="compact-sm"
              variant="default"
              leftSection={<IconDownload size={14} stroke={1.6} />}
              aria-label={`CSV: ${title}`}
            >
              CSV
            </Button>
          )}
          {view === 'picture' && (
            <Button
              size="compact-sm"
              variant="default"
              onClick={() => frame.current && void savePicture(frame.current, fileName)}
              aria-label={`Save picture: ${title}`}
            >
              Save picture
            </Button>
          )}
        </Group>
      </figcaption>
      <div ref={frame} hidden={view !== 'picture'}>
        {children}
      </div>
      {view === 'table' && <div className={classes.table}>{table}</div>}
    </figure>
  );
}
