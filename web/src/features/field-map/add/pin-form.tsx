import type { LonLat } from '@furrowlight/shared/contract/fields';
import { NumberField } from '../../../components/number-field';
import classes from './add-panel.module.css';

interface Props {
  pin: LonLat | null;
  onPin: (pin: LonLat) => void;
}

/** A place for a field whose boundary comes later. */
export function PinForm({ pin, onPin }: Props) {
  return (
    <>
      <p className={classes.hint}>
        Tap the map where the field lies, or type the place. The boundary can be drawn later; rows
        need it.
      </p>
      <div className={classes.two}>
        <NumberField
          label="Longitude"
          unit="°"
          step={0.001}
          value={pin?.[0] ?? null}
          onChange={(lon) => lon !== null && onPin([lon, pin?.[1] ?? 0])}
        />
        <NumberField
          label="Latitude"
          unit="°"
          step={0.001}
          value={pin?.[1] ?? null}
          onChange={(lat) => lat !== null && onPin([pin?.[0] ?? 0, lat])}
        />
      </div>
    </>
  );
}
