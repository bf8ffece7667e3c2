import { useRef, type KeyboardEvent } from 'react';

import type { Axis } from './axis.ts';
import { BandEnd } from './BandEnd.tsx';
import { xToError, type Interval, type StripGeometry } from './geometry.ts';
import { labelWidth, placeLabels, shortened } from './lanes.ts';
import { MarkGlyph } from './MarkGlyph.tsx';
import { keyStep } from './trial.ts';
import { describeMark, percentText } from './words.ts';

interface StripPictureProps {
  geometry: StripGeometry;
  axis: Axis;
  band: Interval;
  summary: string;
  active: number | null;
  onActive: (index: number | null) => void;
  onMove: ((end: 'low' | 'high', to: number) => void) | undefined;
  onSettle: () => void;
  onVisitDraw: ((draw: number) => void) | undefined;
  routesFit: boolean;
  onTrial: boolean;
}

const LANE = 16;
const RULE_ROOM = 22;
const SCALE_ROOM = 28;

/** One stop of the keyboard: what it says, and the mark that it lights. */
interface Stop {
  key: string;
  index: number;
  label: string;
  draw: number;
}

function stopsOf(geometry: StripGeometry): Stop[] {
  const marks = [...geometry.marks, ...geometry.routes]
    .sort((a, b) => a.x - b.x)
    .map(({ index, mark }) => ({ key: `m${index}`, index, label: describeMark(mark), draw: mark.draw }));
  const ends = geometry.gathered.map((end): Stop => {
    const nearest = end.marks[0];
    const told = end.marks
      .slice(0, 4)
      .map(({ mark }) => `${mark.label} (${percentText(mark.relativeError)})`)
      .join('; ');
    const more = end.marks.length > 4 ? `; and ${end.marks.length - 4} more` : '';
    const side = end.side === 'low' ? 'below' : 'above';
    const count = end.marks.length === 1 ? '1 wrong working' : `${end.marks.length} wrong workings`;
    return {
      key: end.side,
      index: nearest?.index ?? 0,
      label: `${count} out of range ${side} the scale: ${told}${more}.`,
      draw: nearest?.mark.draw ?? 1,
    };
  });
  const low = ends.filter((stop) => stop.key === 'low');
  const high = ends.filter((stop) => stop.key === 'high');
  return [...low, ...marks, ...high];
}

/** What stands above each end that has gathered marks: the nearest of them and how far off it is. */
function endLabelsOf({ gathered, width }: StripGeometry): { side: 'low' | 'high'; text: string }[] {
  return gathered.flatMap(({ side, marks }) => {
    const nearest = marks[0]?.mark;
    if (nearest === undefined) return [];
    const distance = percentText(nearest.relativeError);
    const room = width / (gathered.length === 1 ? 1.5 : 2.2) - labelWidth(` ${distance}`);
    return [{ side, text: `${shortened(nearest.label, room)} ${distance}` }];
  });
}

/** The drawing of a scale strip. Left and Right go from mark to mark; Enter goes to the mark's draw. */
export function StripPicture(props: StripPictureProps) {
  const { geometry, axis, band, active, onActive, onMove, onSettle, onVisitDraw } = props;
  const svg = useRef<SVGSVGElement>(null);
  const { width, centre, left, right, range } = geometry;
  const endLabels = endLabelsOf(geometry).map((label) => {
    const wide = labelWidth(label.text) + 8;
    const stretch = label.side === 'low' ? { from: 0, to: wide } : { from: width - wide, to: width };
    return { ...label, stretch, free: !geometry.marks.some(({ x }) => x > stretch.from && x < stretch.to) };
  });
  const reserved = endLabels.filter((label) => label.free).map((label) => label.stretch);
  const labels = placeLabels(geometry.marks, width, width < 480 ? 3 : 4, reserved);
  const used = labels.reduce((most, label) => Math.max(most, label.lane + 1), 0);
  const lanes = endLabels.some((label) => !label.free)
    ? used + 1
    : Math.max(used, Math.min(1, endLabels.length));
  const ruleY = lanes * LANE + RULE_ROOM;
  const height = ruleY + SCALE_ROOM;
  const stops = stopsOf(geometry);
  const first = stops[0]?.key;
  const activeKey = stops.find((stop) => stop.index === active)?.key ?? first;

  const walk = (event: KeyboardEvent, stop: Stop): void => {
    if (event.key === 'Enter' && onVisitDraw !== undefined) {
      event.preventDefault();
      onVisitDraw(stop.draw);
      return;
    }
    const at = stops.indexOf(stop);
    const to = { ArrowRight: at + 1, ArrowLeft: at - 1, Home: 0, End: stops.length - 1 }[event.key];
    const next = to === undefined ? undefined : stops[to];
    if (next === undefined) return;
    event.preventDefault();
    svg.current?.querySelector<SVGGElement>(`[data-stop="${next.key}"]`)?.focus();
  };
  const stopProps = (stop: Stop) => ({
    role: 'img',
    'aria-label': stop.label,
    'data-stop': stop.key,
    tabIndex: stop.key === activeKey ? 0 : -1,
    className: 'strip-stop',
    onFocus: () => onActive(stop.index),
    onBlur: () => onActive(null),
    onPointerEnter: () => onActive(stop.index),
    onPointerLeave: () => onActive(null),
    onKeyDown: (event: KeyboardEvent) => walk(event, stop),
    onClick: () => onVisitDraw?.(stop.draw),
  });
  const errorAt = (clientX: number): number => {
    const box = svg.current?.getBoundingClientRect();
    const x = box === undefined || box.width === 0 ? centre : ((clientX - box.left) / box.width) * width;
    const step = keyStep(range);
    return Math.round(xToError(x, width, range) / step) * step;
  };

  return (
    <svg
      ref={svg}
      viewBox={`0 0 ${width} ${height}`}
      width="100%"
      height={height}
      role="group"
      aria-label={props.summary}
      className="block select-none overflow-visible"
    >
      <rect
        x={geometry.band.x1}
        width={Math.max(1, geometry.band.x2 - geometry.band.x1)}
        y={ruleY - 18}
        height={18}
        className={props.onTrial ? 'strip-band strip-band-trial' : 'strip-band'}
      />
      <line x1={left} x2={right} y1={ruleY} y2={ruleY} className="strip-rule" />
      {geometry.ticks.map((tick) => (
        <line
          key={tick.value}
          x1={tick.x}
          x2={tick.x}
          y1={ruleY}
          y2={ruleY + (tick.major ? 9 : 5)}
          className="strip-tick"
        />
      ))}
      {geometry.ticks
        .filter((tick) => tick.major)
        .map((tick) => (
          <text key={tick.value} x={tick.x} y={ruleY + 22} textAnchor="middle" className="strip-number">
            {axis.tickText(tick.value)}
          </text>
        ))}
      <line x1={centre} x2={centre} y1={ruleY - 20} y2={ruleY + 12} className="strip-centre" />
      <line
        x1={geometry.routeSpread.x1}
        x2={geometry.routeSpread.x2}
        y1={ruleY - 3}
        y2={ruleY - 3}
        className={props.routesFit ? 'strip-spread' : 'strip-spread strip-outside'}
      />
      {endLabels.map(({ side, text, free }) => (
        <text
          key={side}
          x={side === 'low' ? 0 : width}
          y={ruleY - RULE_ROOM - 2 - (free ? 0 : used * LANE)}
          textAnchor={side === 'low' ? 'start' : 'end'}
          className="strip-label"
          aria-hidden="true"
        >
          {text}
        </text>
      ))}
      {labels.map((label) => {
        const placed = geometry.marks.find((mark) => mark.index === label.index);
        const y = ruleY - RULE_ROOM - label.lane * LANE;
        const tone = placed?.mark.insideBand === true ? 'strip-label strip-bad' : 'strip-label';
        return (
          <g key={label.index} aria-hidden="true">
            <line x1={label.x} x2={label.x} y1={y - 6} y2={ruleY - 10} className="strip-leader" />
            <text
              x={label.x + (label.anchor === 'start' ? 4 : -4)}
              y={y - 2}
              textAnchor={label.anchor}
              className={label.index === active ? `${tone} strip-active` : tone}
            >
              {label.text}
            </text>
          </g>
        );
      })}
      {stops.map((stop) => {
        const placed = geometry.marks.find((mark) => `m${mark.index}` === stop.key);
        const route = geometry.routes.find((mark) => `m${mark.index}` === stop.key);
        const end = geometry.gathered.find((gathered) => gathered.side === stop.key);
        return (
          <g key={stop.key} {...stopProps(stop)}>
            <title>{stop.label}</title>
            {placed !== undefined && <MarkGlyph placed={placed} y={ruleY} active={stop.index === active} />}
            {route !== undefined && (
              <>
                <rect x={route.x - 3} y={ruleY - 16} width={6} height={16} fill="transparent" />
                <line x1={route.x} x2={route.x} y1={ruleY - 14} y2={ruleY} className="strip-route" />
              </>
            )}
            {end !== undefined && (
              <text x={end.x} y={ruleY + 4} textAnchor="middle" className="strip-count">
                {end.side === 'low' ? `‹ ${end.marks.length}` : `${end.marks.length} ›`}
              </text>
            )}
          </g>
        );
      })}
      {(['low', 'high'] as const).map((end) => (
        <BandEnd
          key={end}
          end={end}
          x={end === 'low' ? geometry.band.x1 : geometry.band.x2}
          y={ruleY}
          value={band[end]}
          valueText={axis.valueText(band[end])}
          limit={range}
          step={keyStep(range)}
          errorAt={errorAt}
          onMove={onMove === undefined ? undefined : (to) => onMove(end, to)}
          onSettle={onSettle}
        />
      ))}
    </svg>
  );
}
