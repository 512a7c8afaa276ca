import { describe, expect, it } from 'vitest';
import { judgeOrder, swapOrder } from './coordinate-order';
import { parseGeoJson } from './parse-geojson';

const ring = [
  [13.4, 52.5, 34],
  [13.41, 52.5, 34],
  [13.41, 52.51, 34],
  [13.4, 52.51, 34],
];
const polygon = { type: 'Polygon', coordinates: [[...ring, ring[0]]] };
const read = (value: unknown) => parseGeoJson(JSON.stringify(value));

describe('parseGeoJson', () => {
  it('reads a collection, names what it skips and says why', () => {
    const reading = read({
      type: 'FeatureCollection',
      features: [
        { type: 'Feature', properties: { Name: 'Long Acre' }, geometry: polygon },
        { type: 'Feature', properties: null, geometry: { type: 'Point', coordinates: [13, 52] } },
        { type: 'Feature', properties: {}, geometry: null },
        {
          type: 'Feature',
          properties: { id: 7 },
          geometry: {
            type: 'MultiPolygon',
            coordinates: [polygon.coordinates, [ring.slice(0, 2)]],
          },
        },
      ],
    });
    expect(reading.polygons.map(({ name }) => name)).toEqual(['Long Acre', '7 1']);
    expect(reading.skipped).toEqual([
      { at: 'feature 2', why: 'a Point encloses no area' },
      { at: 'feature 3', why: 'it has no geometry' },
      { at: 'feature 4, part 2', why: 'it has fewer than three different corners' },
    ]);
  });

  it('drops altitudes, closes open rings and joins repeated positions', () => {
    const reading = read({ type: 'Polygon', coordinates: [[ring[0], ...ring]] });
    expect(reading.polygons[0].boundary.coordinates[0]).toEqual([
      [13.4, 52.5],
      [13.41, 52.5],
      [13.41, 52.51],
      [13.4, 52.51],
      [13.4, 52.5],
    ]);
  });

  it.each(['', '{"type":"FeatureColl', '[1,2]', '"text"'])('refuses %j with a sentence', (text) => {
    expect(parseGeoJson(text).problem).toMatch(/JSON/);
  });

  it('skips positions that are no numbers instead of guessing', () => {
    const reading = read({ type: 'Polygon', coordinates: [[['13,4', '52,5'], null]] });
    expect(reading.polygons).toEqual([]);
    expect(reading.skipped[0].why).toBe('a position is not two numbers');
  });
});

describe('judgeOrder', () => {
  const read1 = read(polygon).polygons;
  it('accepts longitude before latitude near home', () => {
    expect(judgeOrder(read1, [13, 52])).toBe('fine');
    expect(judgeOrder(read1, null)).toBe('fine');
  });

  it('finds swapped order by impossible latitude or by distance from home, and swaps back', () => {
    const wrong = swapOrder(read1);
    expect(judgeOrder(wrong, [13, 52])).toBe('swapped');
    expect(judgeOrder(swapOrder(wrong), [13, 52])).toBe('fine');
    const east = read({
      type: 'Polygon',
      coordinates: [
        [
          [40, 120],
          [41, 120],
          [41, 121],
          [40, 120],
        ],
      ],
    });
    expect(judgeOrder(east.polygons, null)).toBe('swapped');
  });

  it('names projected metres and far places', () => {
    const metres = read({
      type: 'Polygon',
      coordinates: [
        [
          [391000, 5812000],
          [391100, 5812000],
          [391100, 5812100],
          [391000, 5812000],
        ],
      ],
    });
    expect(judgeOrder(metres.polygons, [13, 52])).toBe('projected');
    expect(judgeOrder(read1, [-100, 40])).toBe('far');
  });
});
