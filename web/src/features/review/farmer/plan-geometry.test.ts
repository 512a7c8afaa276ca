import { describe, expect, it } from 'vitest';
import { aField } from '../../../testing/factories';
import { aLayout } from '../../../testing/scenario-factory';
import { planDrawing, roundLength } from './plan-geometry';

const rings = aField().boundary?.coordinates ?? [];

describe('plan picture', () => {
  it('draws the field to scale: 204 m by 200 m with a margin all round', () => {
    const { width, height } = planDrawing(aLayout(), rings);
    expect(width / 1.12).toBeCloseTo(203.7, 0);
    expect(height).toBeGreaterThan(200);
    expect(height).toBeLessThan(236);
  });

  it('lays every row the server would count', () => {
    const { rows } = planDrawing(aLayout({ pitchM: 20 }), rings);
    expect(rows.match(/M/g)).toHaveLength(9);
    expect(rows).not.toContain('NaN');
  });

  it('has a round scale bar of about a quarter of the width', () => {
    expect(roundLength(230)).toBe(50);
    expect(roundLength(410)).toBe(100);
    expect(roundLength(95)).toBe(20);
  });
});
