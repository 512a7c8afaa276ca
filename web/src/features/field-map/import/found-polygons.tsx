import { ActionIcon, TextInput } from '@mantine/core';
import { IconX } from '@tabler/icons-react';
import { hectares } from '../../../lib/format';
import classes from '../add/add-panel.module.css';
import { figuresOf } from '../boundary/measure';
import { shapeOf } from '../boundary/shape';
import type { ReadPolygon } from './parse-geojson';

interface Props {
  polygons: readonly ReadPolygon[];
  onPolygons: (polygons: ReadPolygon[]) => void;
  /** Refusals by place in the list. */
  outcomes: ReadonlyMap<number, string>;
}

/** The polygons as they will be saved: name, area, and a way to leave one out. */
export function FoundPolygons({ polygons, onPolygons, outcomes }: Props) {
  return (
    <ul className={classes.found}>
      {polygons.map((polygon, i) => (
        <li key={i}>
          <TextInput
            size="xs"
            aria-label={`Name of field ${i + 1}`}
            placeholder={`Field ${i + 1}`}
            value={polygon.name}
            error={outcomes.get(i)}
            onChange={(event) => {
              const name = event.currentTarget.value;
              onPolygons(polygons.map((old, j) => (j === i ? { ...old, name } : old)));
            }}
          />
          <span className="tabular">
            {hectares(figuresOf(shapeOf(polygon.boundary))?.areaM2 ?? 0)}
            <ActionIcon
              variant="subtle"
              color="ink"
              size="sm"
              ml={4}
              aria-label={`Leave out ${polygon.name || `field ${i + 1}`}`}
              onClick={() => onPolygons(polygons.filter((_, j) => j !== i))}
            >
              <IconX size={14} />
            </ActionIcon>
          </span>
        </li>
      ))}
    </ul>
  );
}
