import type { ReviewPage } from '@furrowlight/shared/contract/reviews';
import { Button, SegmentedControl } from '@mantine/core';
import { IconPrinter } from '@tabler/icons-react';
import { useEffect, useState } from 'react';
import { Wordmark } from '../../../components/wordmark';
import { instantIn } from '../../../lib/format';
import { Cautions } from './cautions';
import { CropLight } from './crop-light';
import classes from './farmer.module.css';
import { Meaning } from './meaning';
import { PlanPicture } from './plan-picture';
import { SunOverRows } from './sun-over-rows';
import { YearOfLight } from './year-of-light';

/** The proposal as the farmer reads it: pictures and plain words, nothing to sign up for. */
export function ReviewPageView({ page }: { page: ReviewPage }) {
  const [shown, setShown] = useState(page.scenarios[0].id);
  const scenario = page.scenarios.find(({ id }) => id === shown) ?? page.scenarios[0];
  useEffect(() => {
    document.title = `${page.fieldName} · Furrowlight`;
  }, [page.fieldName]);
  return (
    <main className={classes.page}>
      <header className={classes.head}>
        <Wordmark />
        <Button
          variant="default"
          size="compact-md"
          className="no-print"
          leftSection={<IconPrinter size={16} stroke={1.6} />}
          onClick={() => window.print()}
        >
          Print
        </Button>
      </header>
      <p className={classes.over}>
        {page.farmName}, {page.cooperativeName}
      </p>
      <h1>Panel rows on {page.fieldName}?</h1>
      <blockquote className={classes.greeting}>
        {page.message ||
          'This is what panel rows would do to the light on your field. Please have a look.'}
        <footer>{page.advisorName}, your advisor</footer>
      </blockquote>
      {page.scenarios.length > 1 && (
        <SegmentedControl
          fullWidth
          orientation={page.scenarios.length > 2 ? 'vertical' : 'horizontal'}
          value={scenario.id}
          onChange={setShown}
          data={page.scenarios.map(({ id, name }) => ({ value: id, label: name }))}
          aria-label="Which proposal is shown"
          className="no-print"
        />
      )}
      <PlanPicture page={page} scenario={scenario} />
      <CropLight scenario={scenario} />
      <SunOverRows key={scenario.id} page={page} scenario={scenario} />
      <YearOfLight scenario={scenario} />
      <Meaning scenario={scenario} />
      <Cautions layout={scenario.layout} slopePercent={page.slopePercent} />
      <footer className={classes.foot}>
        <p>
          Light, yield, water and energy on this page are modelled for a typical year (
          {scenario.weatherName}), not measured on your field. You sign nothing here: talk to{' '}
          {page.advisorName} about what should change. This page is open until{' '}
          {instantIn(page.expiresAt, page.timeZone)} ({page.timeZone}).
        </p>
        <p className={classes.stamp}>
          {scenario.name}, plan {scenario.inputHash.slice(0, 12)}, model {scenario.modelVersion}
        </p>
      </footer>
    </main>
  );
}
