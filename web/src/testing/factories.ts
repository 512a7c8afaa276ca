import type { ClientConfig } from '@furrowlight/shared/contract/config';
import type { Crop } from '@furrowlight/shared/contract/crops';
import type { Desk } from '@furrowlight/shared/contract/desk';
import type { Farm } from '@furrowlight/shared/contract/farms';
import type { Field, FieldSeason } from '@furrowlight/shared/contract/fields';
import type { Session } from '@furrowlight/shared/contract/session';

export function aSession(change: Partial<Session> = {}): Session {
  return {
    memberId: 'member-0001',
    name: 'Ida Wendt',
    email: 'ida@example.test',
    role: 'advisor',
    cooperative: {
      id: 'coop-00001',
      name: 'Test cooperative',
      timeZone: 'Europe/Berlin',
      demo: false,
    },
    expiresAt: '2026-12-02T08:00:00.000Z',
    ...change,
  };
}

export function aConfig(change: Partial<ClientConfig> = {}): ClientConfig {
  return {
    version: '0.1.0',
    modelVersion: '0.1.0',
    demo: false,
    demoAccounts: [],
    tileLayers: [],
    ...change,
  };
}

export function aFarm(change: Partial<Farm> = {}): Farm {
  return {
    id: 'farm-00001',
    version: 1,
    name: 'Birkenhof',
    holder: 'Anna Sorge',
    farmNumber: '',
    place: 'Grünau',
    advisorId: null,
    advisorName: null,
    notes: '',
    fieldCount: 1,
    areaM2: 40_000,
    updatedAt: '2026-11-20T10:00:00.000Z',
    ...change,
  };
}

/** A field of about 4 ha near 52.5 N, 13.4 E. */
export function aField(change: Partial<Field> = {}): Field {
  return {
    id: 'field-0001',
    version: 1,
    farmId: 'farm-00001',
    farmName: 'Birkenhof',
    name: 'Long Acre',
    pin: [13.4015, 52.5009],
    boundary: {
      type: 'Polygon',
      coordinates: [
        [
          [13.4, 52.5],
          [13.403, 52.5],
          [13.403, 52.5018],
          [13.4, 52.5018],
          [13.4, 52.5],
        ],
      ],
    },
    elevationM: 60,
    slopePercent: 2,
    aspectDeg: 180,
    albedo: 0.2,
    occluders: [],
    notes: '',
    geometry: {
      areaM2: 40_800,
      perimeterM: 808,
      longestSideBearingDeg: 90,
      longestSideM: 204,
    },
    timeZone: 'Europe/Berlin',
    seasonCount: 0,
    scenarioCount: 0,
    updatedAt: '2026-11-20T10:00:00.000Z',
    ...change,
  };
}

export function aSeason(change: Partial<FieldSeason> = {}): FieldSeason {
  return {
    id: 'season-001',
    version: 1,
    fieldId: 'field-0001',
    cropId: 'winter-wheat',
    cropName: 'Winter wheat',
    sowing: '2026-10-05',
    harvest: '2027-07-28',
    canopyHeightM: 0.8,
    ...change,
  };
}

export function aDesk(change: Partial<Desk> = {}): Desk {
  return {
    counts: { farms: 1, fields: 1, scenarios: 0, openReviews: 0 },
    items: [],
    ...change,
  };
}

export function aCrop(change: Partial<Crop> = {}): Crop {
  return {
    id: 'winter-wheat',
    name: 'Winter wheat',
    latin: 'Triticum aestivum',
    group: 'Cereals',
    shadeClass: 'susceptible',
    photosynthesis: 'C3',
    dliMinMol: null,
    dliGoodLowMol: null,
    dliGoodHighMol: null,
    dliSource: '',
    dliCertainty: '',
    baseTemperatureC: 0,
    lightUseGPerMj: null,
    extinction: null,
    leafAreaMax: null,
    parameterSource: '',
    parameterCertainty: '',
    cropCoefficientMid: null,
    designHeightM: 0.9,
    sowFrom: '10-01',
    sowTo: '10-20',
    harvestFrom: '07-20',
    harvestTo: '08-10',
    seasonSource: '',
    criticalBbch: '',
    criticalNote: '',
    criticalSource: '',
    criticalCertainty: '',
    trialPoints: '',
    trialSource: '',
    notes: '',
    ...change,
  };
}
