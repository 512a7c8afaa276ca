import { PageHead } from '../../components/page-head';
import { Section } from '../../components/section';
import { GLOSSARY } from '../../lib/glossary';
import { NAV, NAV_MORE } from '../shell/nav-items';
import classes from './prose.module.css';

const FIRST_DAY = [
  ['Farm', 'Add the farm and who holds it. Letters and review pages speak to that person.'],
  [
    'Field',
    'Draw its boundary on the map, type corners or side lengths, or bring a GeoJSON file. Give slope, aspect and what stands tall beside it.',
  ],
  ['Season', 'Say what grows there from sowing to harvest. Dates proposed are common practice.'],
  [
    'Weather',
    'Upload an hourly year for the place, or type a monthly climate table when there is none.',
  ],
  [
    'Scenario',
    'Lay rows over the field. Shadow and light curve follow your hand; the full year is worked out when you run it.',
  ],
  ['Compare', 'Set up to four scenarios beside the open field, season by season.'],
  [
    'Review',
    'Send the farmer a link. It needs no account, works on a phone, and ends on its date.',
  ],
] as const;

const KEYS = [
  ['Ctrl + K', 'find a field, scenario or farm, or something to do'],
  ...[...NAV, ...NAV_MORE].map(({ key, label }) => [`g then ${key}`, `go to ${label}`]),
  ['Ctrl + Z', 'take back a step in a boundary'],
  ['Ctrl + Shift + Z', 'do it again'],
  ['Arrow keys on a corner', 'move it by 1 m; with Shift 10 m, with Alt 10 cm'],
  ['Delete on a corner', 'take it away'],
] as const;

/** The advisor's path, the keys and the words, on one page. */
export function Help() {
  return (
    <div className={classes.prose}>
      <PageHead title="Help">
        The way from a field to an agreed plan, the keys, and the words.
      </PageHead>
      <Section title="The way">
        <ol className={classes.way}>
          {FIRST_DAY.map(([name, text]) => (
            <li key={name}>
              <strong>{name}</strong>
              <span>{text}</span>
            </li>
          ))}
        </ol>
      </Section>
      <Section
        title="Keys"
        intro="Single-key shortcuts can be switched off in the account menu, beside your name."
      >
        <dl className={classes.keys}>
          {KEYS.map(([key, what]) => (
            <div key={key}>
              <dt>
                <kbd>{key}</kbd>
              </dt>
              <dd>{what}</dd>
            </div>
          ))}
        </dl>
      </Section>
      <Section title="Words">
        <dl className={classes.words}>
          {Object.entries(GLOSSARY).map(([word, { name, text }]) => (
            <div key={word}>
              <dt>
                {word}
                {name.toLowerCase() !== word.toLowerCase() && <small>{name}</small>}
              </dt>
              <dd>{text}</dd>
            </div>
          ))}
        </dl>
      </Section>
    </div>
  );
}
