import { ActionIcon, SegmentedControl, Slider } from '@mantine/core';
import { IconPlayerPause, IconPlayerPlay } from '@tabler/icons-react';
import { useEffect, useState } from 'react';
import classes from './sun-clock.module.css';

/** A day of the year, from 0, and a local standard hour. */
export interface SunTime {
  day: number;
  hour: number;
}

type Way = 'day' | 'year';

/** A day is played in this many seconds, a year likewise. */
const SECONDS = 12;

export function dayName(day: number): string {
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    timeZone: 'UTC',
  }).format(new Date(Date.UTC(2025, 0, 1 + Math.floor(day))));
}

export function hourName(hour: number): string {
  const minutes = Math.round(hour * 60);
  const two = (value: number) => String(value).padStart(2, '0');
  return `${two(Math.floor(minutes / 60))}:${two(minutes % 60)}`;
}

/** The next moment of a film through the day or the year. */
export function moved(time: SunTime, way: Way, seconds: number): SunTime {
  if (way === 'day') return { ...time, hour: (time.hour + (seconds * 24) / SECONDS) % 24 };
  return { ...time, day: (time.day + (seconds * 365) / SECONDS) % 365 };
}

interface Props {
  time: SunTime;
  onChange: (time: SunTime) => void;
}

/** Date and hour under the thumb, and a film through a day or the year. */
export function SunClock({ time, onChange }: Props) {
  const [playing, setPlaying] = useState(false);
  const [way, setWay] = useState<Way>('day');

  useEffect(() => {
    if (!playing) return undefined;
    let last = performance.now();
    const frame = requestAnimationFrame((now) => {
      onChange(moved(time, way, Math.min((now - last) / 1000 || 1 / 60, 0.1)));
      last = now;
    });
    return () => cancelAnimationFrame(frame);
  }, [playing, way, time, onChange]);

  return (
    <div className={classes.clock}>
      <div className={classes.slider}>
        <span>Hour</span>
        <Slider
          thumbLabel="Hour"
          min={0}
          max={24}
          step={0.25}
          value={time.hour}
          onChange={(hour) => onChange({ ...time, hour })}
          label={null}
          classNames={{ thumb: classes.thumb }}
          thumbProps={{ 'aria-valuetext': hourName(time.hour) }}
        />
        <b>{hourName(time.hour)}</b>
      </div>
      <div className={classes.slider}>
        <span>Date</span>
        <Slider
          thumbLabel="Date"
          min={0}
          max={364}
          step={1}
          value={time.day}
          onChange={(day) => onChange({ ...time, day })}
          label={null}
          classNames={{ thumb: classes.thumb }}
          thumbProps={{ 'aria-valuetext': dayName(time.day) }}
        />
        <b>{dayName(time.day)}</b>
      </div>
      <div className={classes.play}>
        <ActionIcon
          variant="default"
          size={38}
          aria-label={playing ? 'Stop' : 'Let the sun move'}
          onClick={() => setPlaying(!playing)}
        >
          {playing ? (
            <IconPlayerPause size={17} stroke={1.7} />
          ) : (
            <IconPlayerPlay size={17} stroke={1.7} />
          )}
        </ActionIcon>
        <SegmentedControl
          size="xs"
          value={way}
          onChange={(next) => setWay(next === 'year' ? 'year' : 'day')}
          data={[
            { value: 'day', label: 'over the day' },
            { value: 'year', label: 'over the year' },
          ]}
          aria-label="What is played"
        />
      </div>
    </div>
  );
}
