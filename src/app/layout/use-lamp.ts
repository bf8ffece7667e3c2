import { useEffect, useState } from 'react';

const KEY = 'graticule.lamp';
export type Lamp = 'system' | 'on' | 'off';

function stored(): Lamp {
  const value = localStorage.getItem(KEY);
  return value === 'on' || value === 'off' ? value : 'system';
}

/** Puts the lamp setting on the page: light or dark, following the system unless a person chose. */
export function applyLamp(): void {
  const lamp = stored();
  const dark = lamp === 'off' || (lamp === 'system' && matchMedia('(prefers-color-scheme: dark)').matches);
  document.documentElement.dataset['lamp'] = dark ? 'off' : 'on';
}

/** The lamp setting of this browser and how to change it. */
export function useLamp(): [Lamp, (lamp: Lamp) => void] {
  const [lamp, setLamp] = useState<Lamp>(stored);
  useEffect(() => {
    localStorage.setItem(KEY, lamp);
    applyLamp();
    const media = matchMedia('(prefers-color-scheme: dark)');
    media.addEventListener('change', applyLamp);
    return () => media.removeEventListener('change', applyLamp);
  }, [lamp]);
  return [lamp, setLamp];
}
