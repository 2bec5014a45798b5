import type { VerifiedFigure } from './types';

/** The figures of one voice, and the voice's name. */
export interface VoiceGroup {
  voiceId: string;
  figures: VerifiedFigure[];
}

/**
 * Which figures are one voice: those of one contributor, of accounts of one household, and of one physical unit, also
 * through one another (a fridge that two members measured joins the two).
 *
 * Method: union–find. A voice is named after the first of its contributors in text order, so that its stone looks the
 * same whatever the order of the figures.
 * @param figures of one device and one pool, any order.
 * @example groupVoices([figure of "ina", figure of "ina", figure of "orla"]).length // 2
 */
export function groupVoices(figures: readonly VerifiedFigure[]): VoiceGroup[] {
  const parent = new Map<string, string>();
  const find = (key: string): string => {
    const above = parent.get(key);
    if (above === undefined || above === key) return key;
    const root = find(above);
    parent.set(key, root);
    return root;
  };
  const join = (a: string, b: string) => parent.set(find(a), find(b));
  for (const { contributorId, householdId, unitId } of figures) {
    const contributor = `contributor ${contributorId}`;
    if (householdId !== null) join(contributor, `household ${householdId}`);
    if (unitId !== null) join(contributor, `unit ${unitId}`);
  }
  const groups = new Map<string, VerifiedFigure[]>();
  for (const figure of figures) {
    const root = find(`contributor ${figure.contributorId}`);
    const group = groups.get(root);
    if (group) group.push(figure);
    else groups.set(root, [figure]);
  }
  return [...groups.values()]
    .map((group) => ({
      voiceId: group.map((figure) => figure.contributorId).reduce((first, id) => (id < first ? id : first)),
      figures: group.sort((a, b) => byText(a.figureId, b.figureId)),
    }))
    .sort((a, b) => byText(a.voiceId, b.voiceId));
}

/** Order by code units: the same on every machine, whatever its language. */
export function byText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
