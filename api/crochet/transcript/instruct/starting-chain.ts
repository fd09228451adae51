import { type Unit } from '../work/units.ts';
import { BARE } from './event.ts';
import { type Element } from './roles.ts';

/**
 * A line that opens with a chain of one to five may only be getting up to height, or the chain may stand for its first
 * stitch. Gives the ways to take it; which of them holds is for the count to say.
 */
export function startingChains(
  elements: readonly Element[],
  counts: boolean | null,
): readonly { elements: readonly Element[]; cost: number }[] {
  const at = elements.findIndex((element) => element.type === 'unit');
  const first = elements[at];
  const chain = first?.type === 'unit' && first.options.length === 1 ? first.options[0]![0] : undefined;
  if (first?.type !== 'unit' || chain?.type !== 'chain' || chain.many > 5) return [{ elements, cost: 0 }];
  if (elements.slice(0, at).some((element) => element.type === 'oneplace')) return [{ elements, cost: 0 }];
  const without = elements.filter((_, n) => n !== at);
  if (chain.many === 1) return [{ elements: without, cost: 0 }];
  const asUnits = (...units: Unit[]): readonly Element[] =>
    elements.map((element, n) => (n === at ? { ...first, options: [units] } : element));
  const stitch: Unit = { type: 'stitch', stitch: BARE, inOne: 1, times: 1 };
  const out = [
    { elements: without, cost: counts === true ? 0.9 : 0 },
    { elements: asUnits(stitch), cost: counts === true ? 0 : counts === null && chain.many > 2 ? 0.2 : 1 },
  ];
  if (chain.many > 3) out.push({ elements: asUnits(stitch, { type: 'chain', many: chain.many - 3 }), cost: 0.6 });
  return out;
}
