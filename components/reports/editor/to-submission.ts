import { readQuantity, type TypedUnit } from '@/lib/measurement/units/read-quantity';
import { submission, type Phase, type Submission } from '@/lib/reports/schema';
import { STEPS, type EditorValues, type StepKey, type TypedPhaseValues } from './editor-values';

/** Something to put right, with the control it concerns and the step that holds it. */
export interface EditorProblem {
  field: string;
  step: StepKey;
  message: string;
}

/** The report as it would be sent, or everything that stands against it. */
export function toSubmission(
  values: EditorValues,
): { ok: true; submission: Submission } | { ok: false; problems: EditorProblem[] } {
  const problems: EditorProblem[] = [];
  const number = (text: string, unit: TypedUnit, field: string): number | null => {
    const reading = readQuantity(text, unit);
    if (reading.status === 'empty') return null;
    if (reading.status === 'understood') return reading.value;
    const message =
      reading.status === 'range'
        ? 'Give one number here, not a range.'
        : reading.status === 'ask'
          ? `${reading.reason} Give it in ${unit}.`
          : reading.reason;
    problems.push({ field, step: stepOf(field), message });
    return null;
  };
  const typed = values.typed.map((phase, index) => toTypedPhase(phase, `typed.${index}`, number));
  const traced = values.traces.flatMap((trace) =>
    trace.phases.map(({ modeCode, fromSeconds, toSeconds, uses }): Phase => {
      return {
        source: 'trace',
        modeCode,
        tracePublicId: trace.tracePublicId,
        fromSeconds,
        toSeconds,
        uses: wholeNumber(uses),
        note: '',
      };
    }),
  );
  const draft = {
    device: values.proposesDevice
      ? {
          from: 'proposal',
          proposal: {
            maker: values.maker,
            model: values.model,
            categoryPublicId: values.categoryPublicId,
            ...(values.generation ? { generation: values.generation } : {}),
          },
        }
      : {
          from: 'catalogue',
          publicId: values.devicePublicId,
          variantId: values.variantId === '' ? null : Number(values.variantId),
        },
    instrumentPublicId: values.instrumentPublicId,
    licenceAgreed: values.licenceAgreed,
    content: {
      variantLabel: null,
      unitLabel: values.unitLabel.trim() || null,
      methodCode: values.methodCode,
      cautionConfirmed: values.cautionConfirmed,
      supplyClass: values.supplyClass,
      supplyVolts: number(values.supplyVolts, 'V', 'supplyVolts'),
      hertz: number(values.hertz, 'Hz', 'hertz'),
      measuringPoint: values.measuringPoint,
      isOnlyLoad: values.isOnlyLoad === '' ? undefined : values.isOnlyLoad === 'yes',
      ambientCelsius: number(values.ambient, '°C', 'ambient'),
      conditions: Object.fromEntries(Object.entries(values.conditions).filter(([, text]) => text.trim() !== '')),
      heldConstant: values.heldConstant,
      measuredOn: values.measuredOn,
      phases: [...typed, ...traced],
      traces: values.traces.map((trace) => trace.tracePublicId),
      photos: values.photos.map(({ publicId, kind, caption }) => ({ publicId, kind, caption })),
      notes: values.notes,
    },
  };
  const read = submission.safeParse(draft);
  if (read.success && problems.length === 0) return { ok: true, submission: read.data };
  for (const issue of read.error?.issues ?? []) {
    const field = fieldOf(issue.path.map(String), values);
    // A number that could not be read was told already, better than "give a number".
    if (!problems.some((known) => known.field === field)) {
      problems.push({ field, step: stepOf(field), message: issue.message });
    }
  }
  return { ok: false, problems: inOrder(problems) };
}

/** The control that a path of the submission, or a pointer of the API's answer, belongs to. */
export function fieldOf(path: readonly string[], values: EditorValues): string {
  const [first = '', ...rest] = path[0] === 'content' ? path.slice(1) : path;
  if (first === 'device') return values.proposesDevice ? (rest[1] ?? 'maker') : 'device';
  if (first === 'ambientCelsius') return 'ambient';
  if (first === 'conditions') return `conditions.${rest[0] ?? ''}`;
  if (first !== 'phases') return first;
  const index = Number(rest[0] ?? -1);
  const phase = values.typed[index];
  if (!phase) return 'traces';
  const names: Record<string, string> = {
    durationSeconds: 'duration',
    meanWatts: 'mean',
    minimumWatts: 'minimum',
    maximumWatts: 'maximum',
    energyWattHours: 'energy',
  };
  return `typed.${index}.${names[rest[1] ?? ''] ?? rest[1] ?? 'modeCode'}`;
}

export function stepOf(field: string): StepKey {
  const [root = ''] = field.split('.');
  return STEPS.find((step) => (step.fields as readonly string[]).includes(root))?.key ?? 'check';
}

function inOrder(problems: EditorProblem[]): EditorProblem[] {
  const rank = (problem: EditorProblem) => STEPS.findIndex((step) => step.key === problem.step);
  return [...problems].sort((a, b) => rank(a) - rank(b));
}

function toTypedPhase(
  phase: TypedPhaseValues,
  at: string,
  number: (text: string, unit: TypedUnit, field: string) => number | null,
) {
  return {
    source: 'typed' as const,
    modeCode: phase.modeCode,
    startsAt: null,
    durationSeconds: number(phase.duration, 's', `${at}.duration`) ?? 0,
    meanWatts: number(phase.mean, 'W', `${at}.mean`),
    minimumWatts: number(phase.minimum, 'W', `${at}.minimum`),
    maximumWatts: number(phase.maximum, 'W', `${at}.maximum`),
    energyWattHours: number(phase.energy, 'Wh', `${at}.energy`),
    uses: wholeNumber(phase.uses),
    note: phase.note,
  };
}

function wholeNumber(text: string): number | null {
  return text.trim() === '' ? null : Number(text);
}
