import type { Field } from '@furrowlight/shared/contract/fields';
import { Button, Group } from '@mantine/core';
import { Link } from 'react-router-dom';
import { bearing, hectares, withUnit } from '../../lib/format';
import { useMay } from '../../lib/use-may';
import classes from './browse-panel.module.css';

/** The chosen field in three facts and the next step. */
export function SelectedField({ field }: { field: Field }) {
  const { geometry } = field;
  const mayDraw = useMay('fields:write');
  const mayLay = useMay('scenarios:write');
  return (
    <section className={classes.card} aria-label={`Chosen: ${field.name}`}>
      <h2>{field.name}</h2>
      <p className="tabular">
        {geometry
          ? `${hectares(geometry.areaM2)}, longest side ${withUnit(geometry.longestSideM, 'm')} at ${bearing(geometry.longestSideBearingDeg)}`
          : 'Only a pin so far; rows need a boundary to lie in.'}
      </p>
      <Group gap="xs">
        <Button component={Link} to={`/fields/${field.id}`} size="sm">
          Open the field
        </Button>
        {geometry && mayLay && (
          <Button
            component={Link}
            to={`/fields/${field.id}/scenarios/new`}
            size="sm"
            variant="default"
          >
            Lay rows
          </Button>
        )}
        {!geometry && mayDraw && (
          <Button
            component={Link}
            to={`/fields/${field.id}?edit=boundary`}
            size="sm"
            variant="default"
          >
            Draw the boundary
          </Button>
        )}
      </Group>
    </section>
  );
}
