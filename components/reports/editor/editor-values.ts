import type { TraceDescription } from '@/lib/measurement/traces/import/types';
import type { TraceSummary } from './use-editor-data';

/** A stretch of a trace, as the member marks it. */
export interface TracedPhaseValues {
  id: string;
  modeCode: string;
  fromSeconds: number;
  toSeconds: number;
  uses: string;
}

/** A file that was sent, what was read of it, and the phases marked in it. */
export interface TraceValues {
  uploadPublicId: string;
  tracePublicId: string;
  fileName: string;
  zone: string;
  description: TraceDescription;
  summary: TraceSummary;
  phases: TracedPhaseValues[];
}

/** A stretch read off a display; numbers stay as they were typed until they are read. */
export interface TypedPhaseValues {
  id: string;
  modeCode: string;
  duration: string;
  mean: string;
  minimum: string;
  maximum: string;
  energy: string;
  uses: string;
  note: string;
}

export interface PhotoValues {
  publicId: string;
  kind: 'display' | 'set-up' | 'rating-plate';
  caption: string;
  removed: string[];
}

/** Everything that the editor holds, as it was typed: the content of a draft. */
export interface EditorValues {
  deviceName: string;
  devicePublicId: string;
  variantId: string;
  proposesDevice: boolean;
  maker: string;
  model: string;
  categoryPublicId: string;
  generation: string;
  instrumentPublicId: string;
  methodCode: string;
  cautionConfirmed: boolean;
  supplyClass: '' | 'ac-230' | 'ac-120' | 'dc';
  supplyVolts: string;
  hertz: string;
  measuringPoint: '' | 'plug' | 'circuit' | 'battery-side' | 'device-side' | 'behind-adapter';
  isOnlyLoad: '' | 'yes' | 'no';
  ambient: string;
  unitLabel: string;
  conditions: Record<string, string>;
  heldConstant: string;
  measuredOn: string;
  typed: TypedPhaseValues[];
  traces: TraceValues[];
  photos: PhotoValues[];
  notes: string;
  licenceAgreed: boolean;
  /** Made once a draft: sending twice is one report. */
  clientKey: string;
}

export function emptyValues(): EditorValues {
  return {
    deviceName: '',
    devicePublicId: '',
    variantId: '',
    proposesDevice: false,
    maker: '',
    model: '',
    categoryPublicId: '',
    generation: '',
    instrumentPublicId: '',
    methodCode: '',
    cautionConfirmed: false,
    supplyClass: 'ac-230',
    supplyVolts: '',
    hertz: '',
    measuringPoint: '',
    isOnlyLoad: '',
    ambient: '',
    unitLabel: '',
    conditions: {},
    heldConstant: '',
    measuredOn: '',
    typed: [],
    traces: [],
    photos: [],
    notes: '',
    licenceAgreed: false,
    clientKey: crypto.randomUUID(),
  };
}

export const emptyTyped = (modeCode: string): TypedPhaseValues => ({
  id: crypto.randomUUID(),
  modeCode,
  duration: '',
  mean: '',
  minimum: '',
  maximum: '',
  energy: '',
  uses: '',
  note: '',
});

/** The steps in the order of the bench; each names the fields that are its own, for errors to find their place. */
export const STEPS = [
  { key: 'device', title: 'Device', fields: ['device', 'maker', 'model', 'categoryPublicId', 'unitLabel'] },
  { key: 'instrument', title: 'Instrument', fields: ['instrumentPublicId'] },
  {
    key: 'conditions',
    title: 'Method and conditions',
    fields: [
      'methodCode',
      'cautionConfirmed',
      'measuredOn',
      'supplyClass',
      'supplyVolts',
      'hertz',
      'measuringPoint',
      'isOnlyLoad',
      'ambient',
      'conditions',
      'heldConstant',
    ],
  },
  { key: 'readings', title: 'Readings', fields: ['phases', 'typed', 'traces'] },
  { key: 'photos', title: 'Photos', fields: ['photos'] },
  { key: 'notes', title: 'Notes', fields: ['notes'] },
  { key: 'check', title: 'Check and send', fields: ['licenceAgreed'] },
] as const;

export type StepKey = (typeof STEPS)[number]['key'];
