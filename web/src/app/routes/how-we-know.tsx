import { useQuery } from '@tanstack/react-query';
import { PageHead } from '../../components/page-head';
import { Section } from '../../components/section';
import { ValidationTable } from '../../features/knowledge/validation-table';
import { configQuery } from '../../queries/config';
import classes from './prose.module.css';

/** The chain from the sun to the crop, with its sources and its limits, for people who must defend it. */
const CHAIN: { title: string; text: string; source: string }[] = [
  {
    title: 'Where the sun stands',
    text: 'Its azimuth and height at the field, every ten minutes, refraction included. Times are the local standard time of the place; summer time moves no shadow.',
    source: 'Solar position after Meeus; sun-earth distance after Spencer 1971',
  },
  {
    title: 'What light it sends',
    text: 'A sun of 5772 K and 1361 W m⁻², passed through ozone, water vapour, dust and air, split into bands and counted in photons. Under cloud, the spectrum follows the measured beam and diffuse light.',
    source: 'Planck; Bird and Riordan 1986',
  },
  {
    title: 'How the sky shares it out',
    text: 'Hourly weather gives global and diffuse light; where diffuse is missing it is estimated. Light from round the sun keeps to the sun’s side, the rest comes from the whole sky.',
    source: 'Erbs et al. 1982; Hay and Davies 1980',
  },
  {
    title: 'What the rows take',
    text: 'The shadow of every row is cut exactly, position by position across the pitch, at the height of the crop. Light from the sky is counted between all rows, and so is what ground and panels throw back.',
    source: 'Geometry; view factors by crossed strings, Hottel 1954',
  },
  {
    title: 'What the panels make of it',
    text: 'Light on both faces, glass reflection, module temperature, row-on-row shade, the inverter’s limit and the losses you entered.',
    source: 'Faiman 2008 for temperature',
  },
  {
    title: 'What the crop needs',
    text: 'Growth stages and daily light needs from a crop table that names its source and how far it can be trusted, row by row. Where a source gives a range, the result is a range.',
    source: 'Crop table; reference evapotranspiration after FAO-56, Allen et al. 1998',
  },
];

export function HowWeKnow() {
  const config = useQuery(configQuery);
  return (
    <div className={classes.prose}>
      <PageHead title="How we know">
        From the sun to the crop in six steps. Every result names the model version and the inputs
        it was worked out from{config.data ? `; this is model ${config.data.modelVersion}` : ''}.
      </PageHead>
      <ol className={classes.chain}>
        {CHAIN.map((step) => (
          <li key={step.title}>
            <h2>{step.title}</h2>
            <p>{step.text}</p>
            <p className={classes.source}>{step.source}</p>
          </li>
        ))}
      </ol>
      <ValidationTable />
      <Section title="Modelled and measured">
        <p>
          A number marked <strong>modelled</strong> was worked out from weather and layout. A number
          marked <strong>measured</strong> came from an instrument or a weather record. Shares are
          always of the <strong>open field</strong>: the same place, the same hedges, no panels.
        </p>
      </Section>
      <Section title="What this does not know">
        <ul>
          <li>
            Light is planned here, and nothing else. Structure, foundations, wind and snow need a
            licensed engineer; wiring needs an electrician: panels carry live direct current in
            daylight.
          </li>
          <li>
            Yield depends on water, soil, variety and care as much as on light. Yield ranges come
            from trials elsewhere and are wide on purpose.
          </li>
          <li>
            A typical weather year is no forecast. Compare layouts by it; do not promise a single
            season by it.
          </li>
          <li>
            Rule sheets are editable defaults with date and source. Local law and the authority
            decide.
          </li>
          <li>
            Drip edges, erosion, frost and heat pockets, glare and fire access must be looked at on
            the ground.
          </li>
        </ul>
      </Section>
    </div>
  );
}
