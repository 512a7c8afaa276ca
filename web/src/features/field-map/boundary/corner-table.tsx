import { ActionIcon, Button, TextInput } from '@mantine/core';
import { IconPlus, IconX } from '@tabler/icons-react';
import { useState, type KeyboardEvent } from 'react';
import { parseNumber } from '../../../lib/parse-number';
import classes from './boundary-panel.module.css';
import { endOfSide, shifted, sideBetween } from './measure';
import { insertCorner, moveCorner, removeCorner, type CornerRef } from './shape';
import type { BoundaryEditor } from './use-boundary-editor';

interface CellProps {
  label: string;
  value: number;
  decimals: number;
  min: number;
  max: number;
  onCommit: (value: number) => void;
  onFocus: () => void;
}

/** A number that takes effect on Enter or on leaving it, so that half-typed figures move nothing. */
function Cell({ label, value, decimals, min, max, onCommit, onFocus }: CellProps) {
  const [text, setText] = useState<string | null>(null);
  const typed = text === null ? value : parseNumber(text);
  const wrong = typed === null || typed < min || typed > max;
  const commit = () => {
    if (text === null) return;
    if (!wrong && typed.toFixed(decimals) !== value.toFixed(decimals)) onCommit(typed);
    if (!wrong) setText(null);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Enter') {
      event.preventDefault();
      commit();
    }
    if (event.key === 'Escape') setText(null);
  };
  return (
    <TextInput
      aria-label={label}
      inputMode="decimal"
      value={text ?? value.toFixed(decimals)}
      error={wrong ? `${min} to ${max}` : undefined}
      onChange={(event) => setText(event.currentTarget.value)}
      onBlur={commit}
      onKeyDown={onKeyDown}
      onFocus={onFocus}
    />
  );
}

/** Every corner as numbers: position, and the side to the next corner. */
export function CornerTable({ editor, ring }: { editor: BoundaryEditor; ring: number }) {
  const { corners } = editor.shape.rings[ring];
  const many = corners.length;
  const row = (corner: number) => {
    const ref: CornerRef = { ring, corner };
    const at = corners[corner];
    const nextRef: CornerRef = { ring, corner: (corner + 1) % many };
    const side = many > 1 ? sideBetween(at, corners[nextRef.corner]) : null;
    const focus = () => editor.activate(ref);
    const active = editor.active?.ring === ring && editor.active.corner === corner;
    const moveNext = (change: Partial<typeof side>) =>
      side && editor.edit(moveCorner(editor.shape, nextRef, endOfSide(at, { ...side, ...change })));
    return (
      <tr key={corner} data-active={active || undefined}>
        <th scope="row">{corner + 1}</th>
        <td>
          <Cell
            label={`Longitude of corner ${corner + 1}`}
            value={at[0]}
            decimals={6}
            min={-180}
            max={180}
            onFocus={focus}
            onCommit={(lon) => editor.edit(moveCorner(editor.shape, ref, [lon, at[1]]))}
          />
        </td>
        <td>
          <Cell
            label={`Latitude of corner ${corner + 1}`}
            value={at[1]}
            decimals={6}
            min={-90}
            max={90}
            onFocus={focus}
            onCommit={(lat) => editor.edit(moveCorner(editor.shape, ref, [at[0], lat]))}
          />
        </td>
        <td>
          {side && (
            <Cell
              label={`Length of side ${corner + 1} in m`}
              value={side.lengthM}
              decimals={1}
              min={0.1}
              max={20_000}
              onFocus={focus}
              onCommit={(lengthM) => moveNext({ lengthM })}
            />
          )}
        </td>
        <td>
          {side && (
            <Cell
              label={`Bearing of side ${corner + 1} in degrees`}
              value={side.bearingDeg}
              decimals={1}
              min={0}
              max={360}
              onFocus={focus}
              onCommit={(bearingDeg) => moveNext({ bearingDeg })}
            />
          )}
        </td>
        <td>
          <ActionIcon
            variant="subtle"
            color="ink"
            aria-label={`Remove corner ${corner + 1}`}
            disabled={editor.shape.rings[ring].closed && many <= 3}
            onClick={() => editor.edit(removeCorner(editor.shape, ref))}
          >
            <IconX size={15} />
          </ActionIcon>
        </td>
      </tr>
    );
  };
  return (
    <div className={classes.scroll}>
      <table className={classes.corners}>
        <caption className={classes.hint}>
          {ring === 0 ? 'Corners' : `Cut-out ${ring}`}. Length and bearing move the next corner.
        </caption>
        <thead>
          <tr>
            <th scope="col">#</th>
            <th scope="col">Lon °</th>
            <th scope="col">Lat °</th>
            <th scope="col">Side m</th>
            <th scope="col">Bearing °</th>
            <th aria-label="Remove" />
          </tr>
        </thead>
        <tbody>{corners.map((_, corner) => row(corner))}</tbody>
      </table>
      <Button
        size="compact-sm"
        variant="subtle"
        leftSection={<IconPlus size={14} />}
        onClick={() => {
          const last = corners[many - 1];
          editor.edit(insertCorner(editor.shape, { ring, corner: many - 1 }, shifted(last, 20, 0)));
        }}
      >
        Add a corner
      </Button>
    </div>
  );
}
