import { useEffect, useState } from 'react';

const KEY = 'graticule.lamp';

/** Light or dark: as the system says, or as this person chose in this browser. */
export const LAMPS = [
  { lamp: 'system', name: 'as the system' },
  { lamp: 'on', name: 'on' },
  { lamp: 'off', name: 'off' },
] as const;
type Lamp = (typeof LAMPS)[number]['lamp'];

const lampOf = (value: string | null): Lamp => LAMPS.find(({ lamp }) => lamp === value)?.lamp ?? 'system';

/** Puts the lamp setting on the page: light or dark, following the system unless a person chose. */
export function applyLamp(): void {
  const lamp = lampOf(localStorage.getItem(KEY));
  const dark = lamp === 'off' || (lamp === 'system' && matchMedia('(prefers-color-scheme: dark)').matches);
  document.documentElement.dataset['lamp'] = dark ? 'off' : 'on';
}

/** The lamp setting of this browser and how to change it; what it cannot mean is taken as the system's. */
export function useLamp(): [Lamp, (lamp: string) => void] {
  const [lamp, setLamp] = useState<Lamp>(() => lampOf(localStorage.getItem(KEY)));
  useEffect(() => {
    localStorage.setItem(KEY, lamp);
    applyLamp();
  }, [lamp]);
  return [lamp, (next) => setLamp(lampOf(next))];
}
