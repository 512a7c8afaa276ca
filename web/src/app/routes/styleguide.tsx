import {
  Button,
  Checkbox,
  Group,
  SegmentedControl,
  Select,
  Switch,
  TextInput,
} from '@mantine/core';
import { useState } from 'react';
import { EmptyState } from '../../components/empty-state';
import { ErrorPanel } from '../../components/error-panel';
import { Figure, FigureRow } from '../../components/figure';
import { LayoutGlyph } from '../../components/layout-glyph';
import { NumberField } from '../../components/number-field';
import { PageHead } from '../../components/page-head';
import { Section } from '../../components/section';
import { Term } from '../../components/term';
import { Wordmark } from '../../components/wordmark';
import { ApiProblem } from '../../lib/api';
import { LAYOUT_KINDS } from '../../lib/layout-kinds';
import classes from './styleguide.module.css';
import { Swatches } from './styleguide-swatches';

const SAMPLE_PROBLEM = new ApiProblem(
  503,
  'weather-unavailable',
  'The weather source does not answer',
  'Nothing was changed. Try again in a few minutes, or upload a weather file instead.',
  'req-0000',
);

/** Every part of the design system on one page, in the theme of the moment. */
export function Styleguide() {
  const [number, setNumber] = useState<number | null>(9.5);
  return (
    <main className={classes.page}>
      <Wordmark size={36} />
      <PageHead title="Style guide">
        Paper and ink, with light as the only bright thing. All parts, as the pages use them.
      </PageHead>
      <Section title="Colour" intro="Straw is light itself and never carries text.">
        <Swatches />
      </Section>
      <Section title="Type">
        <p className={classes.h1}>Work Sans 600, 32 px: Long Acre</p>
        <p className={classes.h2}>Work Sans 600, 21 px: Seasons</p>
        <p>Work Sans 400, 15 px: how much of the light the barley keeps from April to July.</p>
        <p className={classes.small}>
          Work Sans 400, 14 px, soft: tabular figures <span className="tabular">1 110.27</span>
        </p>
        <p>
          A word that explains itself: <Term of="DLI" />, <Term of="PPFD" />, <Term of="GCR" />.
        </p>
      </Section>
      <Section title="Figures">
        <FigureRow>
          <Figure label="Open field" value="41.6" unit="mol m⁻² d⁻¹" note="modelled" />
          <Figure
            label="Mean under rows"
            value="31.2"
            unit="mol m⁻² d⁻¹"
            note="75 % of open field"
          />
          <Figure label="Power" value="1 223" unit="kWp" />
        </FigureRow>
      </Section>
      <Section title="Controls">
        <Group mb="md">
          <Button>Lay rows</Button>
          <Button variant="default">Compare</Button>
          <Button variant="subtle">Cancel</Button>
          <Button color="danger">Remove</Button>
          <Button disabled>Not yet</Button>
        </Group>
        <div className={classes.controls}>
          <TextInput label="Field name" defaultValue="Long Acre" />
          <TextInput label="Field name" error="Field name is missing." />
          <NumberField label="Pitch" unit="m" value={number} onChange={setNumber} step={0.5} />
          <Select label="Farm" data={['Birkenhof', 'Moosgut']} defaultValue="Moosgut" />
          <Checkbox label="Compare" defaultChecked />
          <Switch label="Archived" />
        </div>
        <SegmentedControl aria-label="Sample choice" data={['Draw', 'Type', 'Pin']} mt="md" />
      </Section>
      <Section title="How panels stand">
        <Group gap="xl">
          {Object.entries(LAYOUT_KINDS).map(([kind, { name }]) => (
            <figure key={kind} className={classes.glyph}>
              <LayoutGlyph kind={kind as keyof typeof LAYOUT_KINDS} size={72} />
              <figcaption>{name}</figcaption>
            </figure>
          ))}
        </Group>
      </Section>
      <Section title="Answers">
        <ErrorPanel error={SAMPLE_PROBLEM} onRetry={() => undefined} />
        <EmptyState title="No season is recorded yet" action={<Button>Add a season</Button>}>
          A season is one crop from sowing to harvest.
        </EmptyState>
      </Section>
    </main>
  );
}
