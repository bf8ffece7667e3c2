// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';

import type { PartScale, StripMark } from '#shared/engine/index.ts';
import { ScaleStrip } from './ScaleStrip.tsx';

afterEach(cleanup);

const mark = (label: string, relativeError: number, kind: StripMark['kind'] = 'slip'): StripMark => ({
  kind,
  label,
  relativeError,
  furthest: relativeError,
  draw: Math.round(Math.abs(relativeError) * 1000),
  insideBand: false,
});
const scale: PartScale = {
  partId: 'p',
  quantity: 'v',
  unit: 'm s^-1',
  band: { below: -0.02, above: 0.02 },
  routeSpread: { below: -0.004, above: 0.003 },
  worstRoute: '',
  worstRouteDraw: null,
  marks: [mark('low one', -0.05), mark('high one', 0.03), mark('far one', 9), mark('route', 0.003, 'route')],
  recommended: { percent: 1, verdict: 'wide', reason: 'A band of 1 % takes every route.' },
};

describe('the scale strip', () => {
  it('is walked mark by mark with the arrow keys, ends included, and reads each out', async () => {
    const user = userEvent.setup();
    const visited = vi.fn();
    render(<ScaleStrip scale={scale} name="Part (a)" onVisitDraw={visited} />);
    await user.tab();
    const read = (): string => document.activeElement?.getAttribute('aria-label') ?? '';
    const heard = [read()];
    for (let step = 0; step < 3; step += 1) {
      await user.keyboard('{ArrowRight}');
      heard.push(read());
    }
    expect(heard[0]).toContain('low one');
    expect(heard[1]).toContain('route');
    expect(heard[2]).toContain('high one');
    expect(heard[3]).toContain('1 wrong working out of range above the scale: far one');
    await user.keyboard('{Home}{Enter}');
    expect(visited).toHaveBeenCalledWith(50);
  });

  it('moves both ends of a plus-or-minus band by keys and hands it on with Enter', async () => {
    const user = userEvent.setup();
    const tried = vi.fn();
    render(<ScaleStrip scale={scale} name="Part (a)" symmetric onTryBand={tried} />);
    const upper = screen.getByRole('slider', { name: 'Upper end of the band' });
    upper.focus();
    await user.keyboard('{ArrowRight}{ArrowRight}');
    expect(tried).not.toHaveBeenCalled();
    expect(Number(upper.getAttribute('aria-valuenow'))).toBeGreaterThan(2);
    await user.keyboard('{Enter}');
    const band = tried.mock.calls[0]?.[0] as { low: number; high: number };
    expect(band.high).toBeGreaterThan(0.02);
    expect(band.low).toBe(-band.high);
  });

  it('takes a typed band', async () => {
    const user = userEvent.setup();
    const tried = vi.fn();
    render(<ScaleStrip scale={scale} name="Part (a)" symmetric onTryBand={tried} />);
    const field = screen.getByLabelText('Band ±');
    await user.clear(field);
    await user.type(field, '1,5{Enter}');
    expect(tried).toHaveBeenCalledWith({ low: -0.015, high: 0.015 });
    await user.clear(field);
    await user.type(field, 'much');
    expect(screen.getByRole('alert').textContent).toBe('Give a number of at least 0.');
  });

  it('says the same in a table', () => {
    render(<ScaleStrip scale={scale} name="Part (a)" />);
    const rows = screen.getAllByRole('row').map((row) => row.textContent);
    expect(rows).toHaveLength(1 + scale.marks.length);
    expect(rows.some((row) => row?.includes('far one'))).toBe(true);
    expect(screen.queryByRole('slider')).toBeNull();
  });

  it('can be read in the unit of the answer', async () => {
    const user = userEvent.setup();
    render(<ScaleStrip scale={scale} name="Part (a)" answer={2e7} />);
    const toggle = screen.getByRole('button', { name: /Show in m/ });
    await user.click(toggle);
    expect(screen.getByText('× 10⁷ m s⁻¹')).toBeDefined();
    expect(screen.getByText('2.040')).toBeDefined();
  });
});
