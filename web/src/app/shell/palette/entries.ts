import type { MemberPermission } from '@furrowlight/shared/access/permissions';
import type { Farm } from '@furrowlight/shared/contract/farms';
import type { Field } from '@furrowlight/shared/contract/fields';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { NAV, NAV_MORE } from '../nav-items';
import type { Recent } from '../../../lib/recent';

export interface Entry {
  id: string;
  group: 'Lately' | 'Do' | 'Go to' | 'Fields' | 'Scenarios' | 'Farms';
  label: string;
  under?: string;
  to: string;
  /** Offered only to those who hold it. */
  needs?: MemberPermission;
}

const fold = (text: string) =>
  text
    .normalize('NFD')
    .replaceAll(/\p{Diacritic}/gu, '')
    .toLowerCase();

/** Every word of the query begins some word of the text, accents and case aside. */
export function matches(query: string, text: string): boolean {
  const words = fold(text).split(/[\s,·/-]+/);
  return fold(query)
    .split(/\s+/)
    .filter(Boolean)
    .every((part) => words.some((word) => word.startsWith(part)));
}

const DO: readonly Entry[] = [
  {
    id: 'do-field',
    group: 'Do',
    label: 'Add a field',
    under: 'draw, pin, type or import',
    to: '/fields?add=draw',
    needs: 'fields:write',
  },
  {
    id: 'do-import',
    group: 'Do',
    label: 'Import boundaries',
    under: 'GeoJSON',
    to: '/fields?add=import',
    needs: 'fields:write',
  },
  { id: 'do-farm', group: 'Do', label: 'Add a farm', to: '/farms?add=1', needs: 'farms:write' },
  {
    id: 'do-weather',
    group: 'Do',
    label: 'Add a weather year',
    to: '/weather',
    needs: 'weather:write',
  },
];

export function fieldEntry(field: Field): Entry {
  return {
    id: `field-${field.id}`,
    group: 'Fields',
    label: field.name,
    under: field.farmName,
    to: `/fields/${field.id}`,
  };
}

export function scenarioEntry(scenario: Scenario, fieldName: string): Entry {
  const ending = scenario.latestRun?.status === 'done' ? '/result' : '';
  return {
    id: `scenario-${scenario.id}`,
    group: 'Scenarios',
    label: scenario.name,
    under: fieldName,
    to: `/fields/${scenario.fieldId}/scenarios/${scenario.id}${ending}`,
  };
}

interface Sources {
  fields: readonly Field[];
  farms: readonly Farm[];
  scenarios: readonly Entry[];
  recent: readonly Recent[];
  may: (permission: MemberPermission) => boolean;
}

/** What the palette offers for a query, best group first; an empty query shows the usual steps. */
export function entriesFor(query: string, sources: Sources): Entry[] {
  const allowed = ({ needs }: { needs?: MemberPermission }) => !needs || sources.may(needs);
  const acts = DO.filter(allowed);
  const pages = [...NAV, ...NAV_MORE]
    .filter(allowed)
    .map(({ to, label }): Entry => ({ id: `go-${to}`, group: 'Go to', label, to }));
  if (query.trim() === '') {
    const lately: Entry[] = sources.recent.map((place) => ({
      id: `recent-${place.to}`,
      group: 'Lately',
      ...place,
    }));
    return [...lately, ...acts, ...pages];
  }
  const keep = (entry: Entry) => matches(query, `${entry.label} ${entry.under ?? ''}`);
  return [
    ...sources.fields.map(fieldEntry).filter(keep).slice(0, 8),
    ...sources.scenarios.filter(keep).slice(0, 8),
    ...sources.farms
      .map((farm): Entry => ({
        id: `farm-${farm.id}`,
        group: 'Farms',
        label: farm.name,
        under: [farm.holder, farm.place].filter(Boolean).join(', '),
        to: `/fields?farm=${farm.id}`,
      }))
      .filter(keep)
      .slice(0, 5),
    ...acts.filter(keep),
    ...pages.filter(keep),
  ];
}
