import type { CropBudget } from '../contract/result.js';
import type { RunCrop } from '../contract/run.js';
import { clearnessOf, referenceEvapotranspiration, windAt2m } from '../crops/evapotranspiration.js';
import { seasonBiomass } from '../crops/light-use.js';
import { yieldBand } from '../crops/response.js';
import { periodBudget, type LightSums } from '../light/budget.js';
import type { RunState } from './state.js';

/** Height at which weather files give wind, m (WMO). */
const WIND_HEIGHT_M = 10;

/** Share of open-field PAR over a crop's weighted windows; the whole season where none is given. */
export function weightedShare(crop: RunCrop, sums: LightSums): number {
  const windows = crop.stages.filter((stage) => stage.weight > 0);
  const used = windows.length > 0 ? windows : [{ ...crop, weight: 1 }];
  let received = 0;
  let open = 0;
  for (const { firstDay, days, weight } of used) {
    const budget = periodBudget(sums, '', firstDay, days);
    received += weight * budget.meanDli * days;
    open += weight * budget.openDli * days;
  }
  return open > 0 ? received / open : 1;
}

/** Reference evapotranspiration over a season in open field and under the rows, mm. */
function seasonWater(state: RunState, crop: RunCrop, sums: LightSums) {
  const { weather, site } = state.input;
  let openMm = 0;
  let shadedMm = 0;
  for (let n = 0; n < crop.days; n += 1) {
    const day = (crop.firstDay + n) % state.days;
    const hours = weather.temperatureC.slice(day * 24, day * 24 + 24);
    const wind = weather.windMs.slice(day * 24, day * 24 + 24);
    const solarMj = weather.ghi
      .slice(day * 24, day * 24 + 24)
      .reduce((sum, value) => sum + (value * 3600) / 1e6, 0);
    const base = {
      latitudeDeg: site.latitude,
      elevationM: site.elevationM,
      dayOfYear: day + 1,
      maxC: Math.max(...hours),
      minC: Math.min(...hours),
      vapourKpa: null,
      wind2m: windAt2m(wind.reduce((sum, value) => sum + value, 0) / 24, WIND_HEIGHT_M),
      solarMj,
    };
    const row = day * sums.positions;
    let under = 0;
    for (let p = 0; p < sums.positions; p += 1) under += sums.par[row + p];
    const share = sums.open[day] > 0 ? under / sums.positions / sums.open[day] : 1;
    const clearness = clearnessOf(base);
    openMm += referenceEvapotranspiration(base, 0, clearness);
    shadedMm += referenceEvapotranspiration({ ...base, solarMj: solarMj * share }, 0, clearness);
  }
  return { openMm, shadedMm };
}

/** Biomass by light use under the rows over that in open field; null without the crop's values. */
function relativeBiomass(crop: RunCrop, sums: LightSums): number | null {
  if (!crop.lightUse) return null;
  const open: number[] = [];
  const under: number[] = [];
  for (let n = 0; n < crop.days; n += 1) {
    const budget = periodBudget(sums, '', (crop.firstDay + n) % sums.days, 1);
    open.push(budget.openDli);
    under.push(budget.meanDli);
  }
  return seasonBiomass(crop.lightUse, open, under).relative;
}

/** Light, yield range and water of one crop between sowing and harvest. */
export function cropBudget(state: RunState, crop: RunCrop): CropBudget {
  const planeIndex = state.planes.findIndex((plane) => plane.heightM === crop.canopyHeightM);
  const { sums } = state.planes[planeIndex];
  const shade = 1 - weightedShare(crop, sums);
  const water = seasonWater(state, crop, sums);
  return {
    seasonId: crop.seasonId,
    cropId: crop.cropId,
    cropName: crop.cropName,
    planeIndex,
    season: periodBudget(sums, crop.cropName, crop.firstDay, crop.days),
    stages: crop.stages.map(({ label, firstDay, days, weight, critical, note }) => ({
      budget: periodBudget(sums, label, firstDay, days),
      weight,
      critical,
      note,
    })),
    yield: { ...yieldBand(crop.shadeClass, shade), shade },
    relativeBiomass: relativeBiomass(crop, sums),
    et0OpenMm: water.openMm,
    et0ShadedMm: water.shadedMm,
  };
}
