import type { Field } from '@furrowlight/shared/contract/fields';
import { useEffect, useRef, type KeyboardEvent } from 'react';
import { hectares } from '../../lib/format';
import classes from './field-list.module.css';

interface Props {
  fields: readonly Field[];
  selectedId: string | null;
  onSelect: (id: string) => void;
  onOpen: (id: string) => void;
}

const optionId = (id: string) => `field-option-${id}`;

/** The map as a list: arrows choose, Enter opens; what is chosen is lit on the map. */
export function FieldList({ fields, selectedId, onSelect, onOpen }: Props) {
  const box = useRef<HTMLDivElement>(null);
  const at = fields.findIndex((field) => field.id === selectedId);

  // Scrolls the list only, never the page: on a phone the map above must stay in sight.
  useEffect(() => {
    const list = box.current;
    const option = selectedId && document.getElementById(optionId(selectedId));
    if (!list || !option) return;
    const above = option.offsetTop - list.offsetTop;
    const below = above + option.offsetHeight - list.clientHeight;
    if (list.scrollTop > above) list.scrollTop = above;
    else if (list.scrollTop < below) list.scrollTop = below;
  }, [selectedId]);

  const onKeyDown = (event: KeyboardEvent) => {
    const last = fields.length - 1;
    const next: Record<string, number> = {
      ArrowDown: Math.min(last, at + 1),
      ArrowUp: Math.max(0, at - 1),
      Home: 0,
      End: last,
    };
    if (event.key === 'Enter' && at >= 0) onOpen(fields[at].id);
    else if (event.key in next && last >= 0) onSelect(fields[next[event.key]].id);
    else return;
    event.preventDefault();
  };

  return (
    <div
      ref={box}
      role="listbox"
      aria-label="Fields"
      tabIndex={0}
      aria-activedescendant={at >= 0 ? optionId(fields[at].id) : undefined}
      className={classes.list}
      onKeyDown={onKeyDown}
    >
      {fields.map((field) => (
        <div
          key={field.id}
          id={optionId(field.id)}
          role="option"
          aria-selected={field.id === selectedId}
          className={classes.option}
          onClick={() => onSelect(field.id)}
          onDoubleClick={() => onOpen(field.id)}
        >
          <span className={classes.name}>{field.name}</span>
          <span className={classes.area}>
            {field.geometry ? hectares(field.geometry.areaM2) : 'pin only'}
          </span>
          <span className={classes.farm}>{field.farmName}</span>
          <span className={classes.state}>{stateOf(field)}</span>
        </div>
      ))}
    </div>
  );
}

/** What the field still lacks, or how many scenarios it has. */
function stateOf(field: Field): string {
  if (!field.geometry) return 'no boundary';
  if (field.scenarioCount > 0) {
    return `${field.scenarioCount} ${field.scenarioCount === 1 ? 'scenario' : 'scenarios'}`;
  }
  return field.seasonCount === 0 ? 'no crop' : '';
}
