import type { Session } from '@furrowlight/shared/contract/session';
import { Modal, VisuallyHidden } from '@mantine/core';
import { useDebouncedValue } from '@mantine/hooks';
import { useQueries, useQuery } from '@tanstack/react-query';
import { useId, useMemo, useState, type KeyboardEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { mayDo } from '../../../lib/use-may';
import { farmListQuery } from '../../../queries/farms';
import { fieldListQuery } from '../../../queries/fields';
import { scenarioListQuery } from '../../../queries/scenarios';
import { useRecent } from '../../../lib/recent';
import classes from './command-palette.module.css';
import { entriesFor, matches, scenarioEntry, type Entry } from './entries';

interface Props {
  opened: boolean;
  onClose: () => void;
  session: Session;
}

/** Ctrl+K: every field, scenario, farm and action by its name. */
export function CommandPalette({ opened, onClose, session }: Props) {
  return (
    <Modal.Root opened={opened} onClose={onClose} size="lg" padding={0} yOffset="12vh">
      <Modal.Overlay />
      <Modal.Content aria-label="Find or do">
        <Modal.Body>
          <PaletteBody onClose={onClose} session={session} />
        </Modal.Body>
      </Modal.Content>
    </Modal.Root>
  );
}

function useEntries(query: string, session: Session): Entry[] {
  const [settled] = useDebouncedValue(query, 150);
  const recent = useRecent(session.memberId);
  const fields = useQuery(fieldListQuery());
  const farms = useQuery(farmListQuery);
  const near = useMemo(
    () =>
      settled.trim() === ''
        ? []
        : (fields.data ?? [])
            .filter((field) => field.scenarioCount > 0)
            .sort(
              (a, b) =>
                Number(matches(settled, `${b.name} ${b.farmName}`)) -
                Number(matches(settled, `${a.name} ${a.farmName}`)),
            )
            .slice(0, 6),
    [fields.data, settled],
  );
  const scenarios = useQueries({ queries: near.map((field) => scenarioListQuery(field.id)) });
  const found = scenarios.flatMap((list, i) =>
    (list.data ?? [])
      .filter((scenario) => !scenario.archived)
      .map((scenario) => scenarioEntry(scenario, near[i].name)),
  );
  return entriesFor(query, {
    fields: fields.data ?? [],
    farms: farms.data ?? [],
    scenarios: found,
    recent,
    may: (permission) => mayDo(session, permission),
  });
}

function PaletteBody({ onClose, session }: Omit<Props, 'opened'>) {
  const [query, setQuery] = useState('');
  const [at, setAt] = useState(0);
  const navigate = useNavigate();
  const listId = useId();
  const entries = useEntries(query, session);
  const active = Math.min(at, Math.max(0, entries.length - 1));

  const go = (entry: Entry | undefined) => {
    if (!entry) return;
    onClose();
    void navigate(entry.to);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'ArrowDown') setAt((active + 1) % Math.max(1, entries.length));
    else if (event.key === 'ArrowUp')
      setAt((active - 1 + entries.length) % Math.max(1, entries.length));
    else if (event.key === 'Enter') go(entries[active]);
    else return;
    event.preventDefault();
  };

  return (
    <div onKeyDown={onKeyDown}>
      <input
        className={classes.input}
        data-autofocus
        role="combobox"
        aria-expanded
        aria-controls={listId}
        aria-activedescendant={entries[active] ? `${listId}-${active}` : undefined}
        aria-label="Find a field, scenario or farm, or something to do"
        placeholder="A field, a scenario, something to do"
        value={query}
        onChange={(event) => {
          setQuery(event.currentTarget.value);
          setAt(0);
        }}
      />
      <div id={listId} role="listbox" aria-label="Found" className={classes.list}>
        {entries.map((entry, i) => (
          <div key={entry.id} role="presentation">
            {entries[i - 1]?.group !== entry.group && (
              <div className={classes.group} role="presentation">
                {entry.group}
              </div>
            )}
            <div
              id={`${listId}-${i}`}
              role="option"
              aria-selected={i === active}
              className={classes.option}
              ref={i === active ? (node) => node?.scrollIntoView({ block: 'nearest' }) : undefined}
              onMouseMove={() => i !== active && setAt(i)}
              onClick={() => go(entry)}
            >
              <span>{entry.label}</span>
              {entry.under && <small>{entry.under}</small>}
            </div>
          </div>
        ))}
      </div>
      {entries.length === 0 && (
        <p className={classes.none}>
          Nothing has that name. Try the farm&apos;s name or fewer letters.
        </p>
      )}
      <VisuallyHidden role="status">{entries.length} found</VisuallyHidden>
    </div>
  );
}
