import type { Field, Occluder } from '@furrowlight/shared/contract/fields';
import { ActionIcon, Button, Group, Select } from '@mantine/core';
import { IconPlus, IconTrash } from '@tabler/icons-react';
import { useState } from 'react';
import { NumberField } from '../../../components/number-field';
import { Section } from '../../../components/section';
import { withUnit } from '../../../lib/format';
import { useMay } from '../../../lib/use-may';
import { sideBetween } from '../boundary/measure';
import classes from './overview.module.css';
import { OCCLUDER_KINDS } from './occluder-kinds';
import { SaveAnswers } from './save-answers';
import { useFieldSave } from './use-field-save';
import type { OccluderDrawing } from './use-occluder-drawing';

const lengthOf = ({ line }: Occluder) =>
  line.slice(1).reduce((sum, at, i) => sum + sideBetween(line[i], at).lengthM, 0);

/** Hedges, woods and buildings that take light from the field. */
export function OccludersSection({ field, drawing }: { field: Field; drawing: OccluderDrawing }) {
  const write = useFieldSave(field);
  const mayWrite = useMay('fields:write');
  const [kind, setKind] = useState<Occluder['kind']>('hedge');
  const [heightM, setHeight] = useState<number | null>(4);
  const { line } = drawing;
  const base = { value: field, version: field.version };
  const heightWrong = heightM === null || heightM < 0.2 || heightM > 60;

  const add = async () => {
    if (!line || line.length < 2 || heightWrong) return;
    const saved = await write.save(
      { occluders: [...field.occluders, { kind, heightM, line }] },
      base,
    );
    if (saved) drawing.stop();
  };
  const remove = (index: number) =>
    void write.save({ occluders: field.occluders.filter((_, i) => i !== index) }, base);

  return (
    <Section
      title="Hedges, woods, buildings"
      intro={
        field.occluders.length === 0 && !line
          ? 'What stands tall beside the field takes light before any panel does. Draw a line where it stands and give its height.'
          : undefined
      }
      actions={
        mayWrite &&
        !line && (
          <Button variant="default" leftSection={<IconPlus size={16} />} onClick={drawing.start}>
            Add one
          </Button>
        )
      }
    >
      <SaveAnswers write={write} onTheirs={drawing.stop} onSaved={drawing.stop} />
      {Object.values(write.messages).map((message) => (
        <p key={message} role="alert" className={classes.refusal}>
          {message}
        </p>
      ))}
      <ul className={classes.list}>
        {field.occluders.map((occluder, i) => (
          <li key={i}>
            <div>
              <strong>{OCCLUDER_KINDS[occluder.kind]}</strong>
              <small className="tabular">
                {withUnit(occluder.heightM, 'm', 1)} high, {withUnit(lengthOf(occluder), 'm')} long
              </small>
            </div>
            {mayWrite && (
              <ActionIcon
                variant="subtle"
                color="ink"
                size="lg"
                aria-label={`Remove ${OCCLUDER_KINDS[occluder.kind]} ${i + 1}`}
                disabled={write.saving}
                onClick={() => remove(i)}
              >
                <IconTrash size={17} stroke={1.6} />
              </ActionIcon>
            )}
          </li>
        ))}
      </ul>
      {line && (
        <div className={classes.form}>
          <p className={classes.hint} role="status">
            {line.length < 2
              ? 'Tap its beginning and end on the map above.'
              : `${line.length} points. Go on tapping, or add it.`}
          </p>
          <div className={classes.grid}>
            <Select
              label="What stands there"
              allowDeselect={false}
              data={Object.entries(OCCLUDER_KINDS).map(([value, label]) => ({ value, label }))}
              value={kind}
              onChange={(value) => value && setKind(value as Occluder['kind'])}
            />
            <NumberField
              label="Height"
              unit="m"
              step={0.5}
              value={heightM}
              onChange={setHeight}
              error={heightWrong ? 'Between 0.2 and 60 m.' : undefined}
            />
          </div>
          <Group gap="xs">
            <Button
              disabled={line.length < 2 || heightWrong}
              loading={write.saving}
              onClick={() => void add()}
            >
              Add it
            </Button>
            <Button variant="default" disabled={line.length === 0} onClick={drawing.undo}>
              Undo point
            </Button>
            <Button variant="subtle" onClick={drawing.stop}>
              Cancel
            </Button>
          </Group>
        </div>
      )}
    </Section>
  );
}
