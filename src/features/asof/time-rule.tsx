import { useLayoutEffect, useMemo, useRef, useState } from 'react';
import { sayDay } from '#src/lib/say.ts';
import { dayAt, dayNumber, ruleMarks, ruleSpan, ruleTicks, type LawDay } from './rule-scale.ts';

export interface TimeRuleProps {
  readonly day: string;
  readonly today: string;
  readonly changes: readonly LawDay[];
  /** Said where nothing changes. */
  readonly none: string;
  readonly label: string;
  readonly onDay: (day: string) => void;
}

/** A thin rule of time: the day looked at, and the days on which the law changes for this product. */
export function TimeRule({ day, today, changes, none, label, onDay }: TimeRuleProps) {
  const box = useRef<HTMLDivElement>(null);
  const [width, setWidth] = useState(800);
  useLayoutEffect(() => {
    const element = box.current;
    if (!element) return;
    const measure = () => setWidth((before) => element.clientWidth || before);
    measure();
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  const span = useMemo(() => ruleSpan([day, ...changes.map((each) => each.date)], today), [day, changes, today]);
  const marks = ruleMarks(changes, span, width);
  const jump = (by: 1 | -1) => {
    const days = changes.map((each) => each.date).toSorted();
    const next = by > 0 ? days.find((each) => each > day) : days.findLast((each) => each < day);
    if (next) onDay(next);
  };
  return (
    <div className="time-rule" ref={box}>
      <svg aria-hidden="true">
        {ruleTicks(span, width).map((tick) => (
          <g key={tick.x}>
            <path d={`M${Math.round(tick.x) + 0.5} 34v${tick.length}`} stroke="var(--edge)" />
            {tick.year ? <text x={Math.round(tick.x) + 5} y="53">{tick.year}</text> : null}
          </g>
        ))}
        <path d={`M0 34.5H${width}`} stroke="var(--edge)" />
        {marks.map((mark) => (
          <path key={`${mark.day.date}${mark.day.words}`} d={`M${Math.round(mark.x) + 0.5} 20v22`} stroke="var(--ink)" strokeWidth="2" />
        ))}
      </svg>
      {changes.length === 0 ? <span className="law" style={{ left: 0 }}>{none}</span> : null}
      {marks.map((mark) =>
        mark.label ? (
          <button
            type="button"
            key={`${mark.day.date}${mark.day.words}`}
            className="law"
            style={mark.label.align === 'start' ? { left: mark.label.at } : { right: width - mark.label.at }}
            title={`${sayDay(mark.day.date)}: ${mark.day.words}`}
            aria-label={`Look at ${sayDay(mark.day.date)}: ${mark.day.words}`}
            onClick={() => onDay(mark.day.date)}
          >
            <b>{sayDay(mark.day.date)}</b> {mark.label.hasWords ? mark.day.words : null}
          </button>
        ) : null,
      )}
      <input
        type="range"
        min={0}
        max={dayNumber(span.to, span.from)}
        value={dayNumber(day, span.from)}
        aria-label={label}
        aria-valuetext={sayDay(day)}
        onChange={(event) => onDay(dayAt(Number(event.target.value), span.from))}
        onKeyDown={(event) => {
          // Page keys go from one change of the law to the next.
          if (event.key !== 'PageUp' && event.key !== 'PageDown') return;
          event.preventDefault();
          jump(event.key === 'PageUp' ? 1 : -1);
        }}
      />
    </div>
  );
}
