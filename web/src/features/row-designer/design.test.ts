import { Layout, LayoutKind } from '@furrowlight/shared/contract/layout';
import { bayClearWidthM } from '@furrowlight/shared/layout/machine-passes';
import { describe, expect, it } from 'vitest';
import { aSeason } from '../../testing/factories';
import { cropInView } from './crop-in-view';
import { azimuthAlong, designMessages, soundLayout, usualAzimuth } from './design';
import { presetOf } from './presets';

describe('design', () => {
  it.each(LayoutKind.options)(
    'starts %s rows that the contract accepts on both halves of the earth',
    (kind) => {
      for (const latitude of [52, -34]) {
        const preset = presetOf(kind, latitude);
        expect(Layout.safeParse(preset).success).toBe(true);
        expect(bayClearWidthM(preset)).toBeGreaterThan(3);
      }
      expect(presetOf('overhead-fixed', -34).azimuthDeg).toBe(0);
    },
  );

  it('says in plain words what is missing and what collides', () => {
    const layout = presetOf('overhead-fixed', 50);
    const design = { name: ' ', notes: '', weatherId: null, layout: { ...layout, pitchM: 2 } };
    const messages = designMessages(design);
    expect(messages.name).toBe('Scenario name is missing.');
    expect(messages['layout.pitchM']).toContain('Rows would collide');
    expect(
      designMessages({ ...design, layout: { ...layout, tiltDeg: null } })['layout.tiltDeg'],
    ).toBe('Tilt must be between 0 and 90 degrees.');
    expect(soundLayout({ ...layout, pitchM: 2 })).toBeNull();
    expect(soundLayout(layout)).toEqual(layout);
  });

  it('lays rows along a side, facing the nearer of both ways', () => {
    expect(azimuthAlong(90, usualAzimuth('overhead-fixed', 50))).toBe(180);
    expect(azimuthAlong(70, 180)).toBe(160);
    expect(azimuthAlong(120, 180)).toBe(210);
    expect(azimuthAlong(10, 90)).toBe(100);
    expect(azimuthAlong(90, 0)).toBe(0);
  });

  it('counts light from sowing to harvest, over New Year too', () => {
    const crop = cropInView(aSeason({ sowing: '2026-10-05', harvest: '2027-07-28' }));
    expect(crop.season).toEqual({ firstDay: 277, days: 297 });
    expect(crop.name).toBe('Winter wheat 2027');
  });
});
