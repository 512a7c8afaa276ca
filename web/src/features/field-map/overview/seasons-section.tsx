import type { Field, FieldSeason } from '@furrowlight/shared/contract/fields';
import { ActionIcon, Button, Drawer, Group, Skeleton } from '@mantine/core';
import { IconPencil, IconPlus, IconTrash } from '@tabler/icons-react';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { ErrorPanel } from '../../../components/error-panel';
import { Section } from '../../../components/section';
import { showUndo } from '../../../components/undo-notice';
import { newIdempotencyKey } from '../../../lib/api';
import { calendarDate, withUnit } from '../../../lib/format';
import { useMay } from '../../../lib/use-may';
import { createSeason, removeSeason, seasonListQuery } from '../../../queries/seasons';
import classes from './overview.module.css';
import { SeasonForm } from './season-form';
import { SeasonRibbon } from './season-ribbon';

interface Props {
  field: Field;
  /** `new`, the id of the season under change, or null. */
  open: string | null;
  onOpen: (season: string | null) => void;
}

/** What grows here and when: the rotation. */
export function SeasonsSection({ field, open, onOpen }: Props) {
  const seasons = useQuery(seasonListQuery(field.id));
  const mayWrite = useMay('fields:write');
  const list = [...(seasons.data ?? [])].sort((a, b) => a.sowing.localeCompare(b.sowing));
  const editing = list.find(({ id }) => id === open) ?? null;
  const today = new Date().toLocaleDateString('sv-SE', { timeZone: field.timeZone });
  return (
    <div id="seasons">
      <Section
        title="Seasons"
        intro={
          list.length === 0 && seasons.isSuccess
            ? 'A season is one crop from sowing to harvest. Its stages set how much light it needs and when.'
            : undefined
        }
        actions={
          mayWrite && (
            <Button
              variant="default"
              leftSection={<IconPlus size={16} />}
              onClick={() => onOpen('new')}
            >
              Add a season
            </Button>
          )
        }
      >
        {seasons.isPending && <Skeleton height={120} />}
        {seasons.isError && (
          <ErrorPanel error={seasons.error} onRetry={() => void seasons.refetch()} />
        )}
        <SeasonRibbon seasons={list} today={today} />
        <ul className={classes.list}>
          {list.map((season) => (
            <SeasonRow
              key={season.id}
              season={season}
              onChange={mayWrite ? () => onOpen(season.id) : undefined}
            />
          ))}
        </ul>
      </Section>
      <Drawer
        opened={mayWrite && (open === 'new' || editing !== null)}
        onClose={() => onOpen(null)}
        position="right"
        title={editing ? editing.cropName : 'Add a season'}
        closeButtonProps={{ 'aria-label': 'Close' }}
      >
        <SeasonForm
          key={editing?.id ?? 'new'}
          fieldId={field.id}
          season={editing}
          onDone={() => onOpen(null)}
        />
      </Drawer>
    </div>
  );
}

function SeasonRow({ season, onChange }: { season: FieldSeason; onChange?: () => void }) {
  const client = useQueryClient();
  const remove = useMutation(removeSeason(client, season.fieldId));
  const create = useMutation(createSeason(client, season.fieldId));
  const takeAway = async () => {
    await remove.mutateAsync({ id: season.id, version: season.version });
    const { cropId, sowing, harvest, canopyHeightM } = season;
    showUndo(`${season.cropName} is taken out of the rotation.`, () =>
      create.mutate({
        input: { cropId, sowing, harvest, canopyHeightM },
        idempotencyKey: newIdempotencyKey(),
      }),
    );
  };
  return (
    <li>
      <div>
        <strong>{season.cropName}</strong>
        <small className="tabular">
          {calendarDate(season.sowing)} to {calendarDate(season.harvest)}, canopy{' '}
          {withUnit(season.canopyHeightM, 'm', 1)}
        </small>
        {remove.isError && <ErrorPanel error={remove.error} />}
      </div>
      {onChange && (
        <Group gap={4}>
          <ActionIcon
            variant="subtle"
            color="ink"
            size="lg"
            aria-label={`Change ${season.cropName}`}
            onClick={onChange}
          >
            <IconPencil size={17} stroke={1.6} />
          </ActionIcon>
          <ActionIcon
            variant="subtle"
            color="ink"
            size="lg"
            aria-label={`Remove ${season.cropName}`}
            loading={remove.isPending}
            onClick={() => void takeAway().catch(() => undefined)}
          >
            <IconTrash size={17} stroke={1.6} />
          </ActionIcon>
        </Group>
      )}
    </li>
  );
}
