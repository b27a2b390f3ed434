import { memo, useState, type KeyboardEvent } from 'react';
import type { Phase, ProcessStep, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Finding } from '#shared/engine/types.ts';
import { toCelsius, toFahrenheit } from '#shared/product/handling.ts';
import { Button, IconButton } from '#src/ui/button.tsx';
import { AreaField, TextField } from '#src/ui/field.tsx';
import { VerdictMark } from '#src/ui/verdict-mark.tsx';
import { addStep, moveStep, removeStep, writeStep } from './recipes.ts';
import { readTemperature, readTime, sayTemperature, sayTime } from './read-step.ts';
import './process.css';

export interface ProcessStepsProps {
  readonly draft: ProductDraft;
  /** Steps that a material does not bear. */
  readonly findings: readonly Finding[];
  /** The house's unit for what is typed without one. */
  readonly unit: 'C' | 'F';
  readonly isReadOnly: boolean;
  readonly newId: () => string;
  readonly onChange: (recipe: (draft: ProductDraft) => ProductDraft, join?: string) => void;
  readonly onSettle: () => void;
}

/** Typing an amount leaves the steps alone. */
function sameSteps(before: ProcessStepsProps, after: ProcessStepsProps): boolean {
  const [a, b] = [before.draft.formula.phases, after.draft.formula.phases];
  return a.length === b.length && a.every((phase, at) => phase.id === b[at]!.id && phase.name === b[at]!.name && phase.steps === b[at]!.steps) && before.findings === after.findings && before.isReadOnly === after.isReadOnly && before.unit === after.unit;
}

/** How each phase is made, step by step; a step that a material does not bear says so where it stands. */
export const ProcessSteps = memo(function ProcessSteps(props: ProcessStepsProps) {
  const { draft, findings } = props;
  const ofSteps = new Set(draft.formula.phases.flatMap((phase) => phase.steps.map((step) => step.id)));
  const isOfStep = (finding: Finding) => finding.arithmetic?.some((each) => each.from !== undefined && ofSteps.has(each.from)) ?? false;
  const general = findings.filter((finding) => !isOfStep(finding));
  return (
    <div className="process">
      {draft.formula.phases.map((phase) => (
        <PhaseSteps key={phase.id} phase={phase} {...props} />
      ))}
      {general.map((finding) => <StepFinding key={`${finding.rule}${finding.subject}${finding.message}`} finding={finding} />)}
    </div>
  );
}, sameSteps);

function PhaseSteps({ phase, findings, unit, isReadOnly, newId, onChange, onSettle }: ProcessStepsProps & { phase: Phase }) {
  return (
    <section aria-label={`Steps of ${phase.name}`}>
      <h3>{phase.name}</h3>
      <ol>
        {phase.steps.map((step, index) => (
          <li key={step.id}>
            <StepFields
              step={step}
              place={index + 1}
              unit={unit}
              isReadOnly={isReadOnly}
              isFirst={index === 0}
              isLast={index === phase.steps.length - 1}
              onWrite={(change, join) => onChange(writeStep(phase.id, step.id, change), join)}
              onMove={(by) => onChange(moveStep(phase.id, step.id, by))}
              onRemove={() => onChange(removeStep(phase.id, step.id))}
              onSettle={onSettle}
            />
            {findings.filter((finding) => finding.arithmetic?.some((each) => each.from === step.id)).map((finding) => <StepFinding key={finding.rule + finding.subject} finding={finding} />)}
          </li>
        ))}
      </ol>
      {isReadOnly ? null : <Button small icon="plus" onClick={() => onChange(addStep(phase.id, newId()))}>Add a step<span className="sr-only"> to {phase.name}</span></Button>}
    </section>
  );
}

function StepFinding({ finding }: { finding: Finding }) {
  return (
    <p className="step-finding" role="status">
      <VerdictMark weight={finding.severity} />
      <span>{finding.message} {finding.remedy} <span className="cite">{finding.citation}.</span></span>
    </p>
  );
}

interface StepFieldsProps {
  readonly step: ProcessStep;
  readonly place: number;
  readonly unit: 'C' | 'F';
  readonly isReadOnly: boolean;
  readonly isFirst: boolean;
  readonly isLast: boolean;
  readonly onWrite: (change: Partial<Omit<ProcessStep, 'id'>>, join?: string) => void;
  readonly onMove: (by: -1 | 1) => void;
  readonly onRemove: () => void;
  readonly onSettle: () => void;
}

function StepFields({ step, place, unit, isReadOnly, isFirst, isLast, onWrite, onMove, onRemove, onSettle }: StepFieldsProps) {
  const [heat, setHeat] = useState<string | null>(null);
  const [time, setTime] = useState<string | null>(null);
  const heatRead = heat === null ? null : readTemperature(heat, step.temperature?.unit ?? unit);
  const timeRead = time === null ? null : readTime(time);
  const handleKey = (event: KeyboardEvent) => {
    if (!event.altKey || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return;
    event.preventDefault();
    onMove(event.key === 'ArrowUp' ? -1 : 1);
  };
  return (
    <div
      className="step"
      role="group"
      aria-label={`Step ${place}`}
    >
      <span className="place" aria-hidden="true">{place}</span>
      <AreaField label={`Step ${place}`} bare rows={1} readOnly={isReadOnly} maxLength={1000} placeholder="What is done" value={step.text} onChange={(event) => onWrite({ text: event.target.value }, `step:${step.id}`)} onBlur={onSettle} onKeyDown={handleKey} />
      <TextField
        label={`Step ${place}, temperature`}
        bare
        readOnly={isReadOnly}
        placeholder={`70 to 75 °${unit}`}
        title={otherUnit(step.temperature)}
        value={heat ?? sayTemperature(step.temperature)}
        error={heatRead && 'fault' in heatRead ? heatRead.fault : undefined}
        onChange={(event) => {
          setHeat(event.target.value);
          const read = readTemperature(event.target.value, step.temperature?.unit ?? unit);
          if ('temperature' in read) onWrite({ temperature: read.temperature }, `heat:${step.id}`);
        }}
        onBlur={() => {
          if (!heatRead || 'temperature' in heatRead) setHeat(null);
          onSettle();
        }}
      />
      <TextField
        label={`Step ${place}, time`}
        bare
        readOnly={isReadOnly}
        placeholder="20 min, 8 h"
        value={time ?? sayTime(step.time)}
        error={timeRead && 'fault' in timeRead ? timeRead.fault : undefined}
        onChange={(event) => {
          setTime(event.target.value);
          const read = readTime(event.target.value);
          if ('time' in read) onWrite({ time: read.time }, `time:${step.id}`);
        }}
        onBlur={() => {
          if (!timeRead || 'time' in timeRead) setTime(null);
          onSettle();
        }}
      />
      {isReadOnly ? null : (
        <span className="moves">
          <IconButton icon="up" word={`Step ${place}: earlier`} disabled={isFirst} onClick={() => onMove(-1)} />
          <IconButton icon="down" word={`Step ${place}: later`} disabled={isLast} onClick={() => onMove(1)} />
          <IconButton icon="away" word={`Step ${place}: remove`} onClick={onRemove} />
        </span>
      )}
    </div>
  );
}

/** The same temperature in the other unit, for the title. */
function otherUnit(temperature: ProcessStep['temperature']): string | undefined {
  if (!temperature) return undefined;
  const turn = temperature.unit === 'C' ? toFahrenheit : toCelsius;
  const figures = [temperature.from, temperature.to].flatMap((each) => (each === undefined ? [] : (turn(each) ?? []))).map((each) => String(Math.round(Number(each) * 10) / 10));
  return figures.length > 0 ? `${figures.join(' to ')} °${temperature.unit === 'C' ? 'F' : 'C'}` : undefined;
}
