/* Fluids of the invented site: states at relieving conditions with the origin of each figure. */
import { type Fluid } from '@domain/basis';
import supplement from '../data/supplement/equipment.json';
import { type DemoFluid, type DemoFluidFigure } from './demo-types';
import { compact, figureOf, maybeFigure } from './figures';
import { idOf } from './ids';

const PHASES: Record<string, Fluid['phase']> = {
  'saturated vapour': 'vapour',
  gas: 'gas',
  liquid: 'liquid',
  'saturated liquid, flashing': 'flashing-liquid',
};

/** Their name of a figure → ours. */
const FIGURES = {
  T: 'T',
  M: 'M',
  Z: 'Z',
  k: 'k',
  latent_heat: 'latentHeat',
  density_vapour: 'rhoVapour',
  density_liquid: 'rhoLiquid',
  viscosity_vapour: 'muVapour',
  viscosity_liquid: 'muLiquid',
  expansion_coefficient: 'expansion',
  heat_capacity: 'cpLiquid',
  critical_pressure: 'Pc',
  v0: 'v0',
  v9: 'v9',
} as const satisfies Partial<Record<DemoFluidFigure, keyof Fluid>>;

function fromOf(fluid: DemoFluid): Fluid['from'] {
  if (!fluid.state) return { kind: 'own' };
  const kind = fluid.state.pure === 'Water' ? 'water' : 'substance';
  return { kind, substance: fluid.state.pure, saturatedAt: figureOf(fluid.state.saturated_at) };
}

function hazardsOf(fluid: DemoFluid): Fluid['hazards'] {
  return supplement.notFlammable.some((start) => fluid.id.startsWith(start))
    ? undefined
    : { flammable: true };
}

/** The id of a fluid inside its document. */
export const fluidId = (id: string): string => idOf('fl', id);

/** One fluid. */
export function fluidOf(fluid: DemoFluid): Fluid {
  const figures = Object.fromEntries(
    Object.entries(FIGURES).map(([theirs, ours]) => [
      ours,
      maybeFigure(fluid[theirs as keyof typeof FIGURES]),
    ]),
  );
  const vapourPressure = fluid.vapour_pressure;
  return compact({
    id: fluidId(fluid.id),
    name: fluid.name,
    note: fluid.note,
    phase: PHASES[fluid.phase] ?? 'gas',
    from: fromOf(fluid),
    P: maybeFigure(fluid.state?.saturated_at),
    ...figures,
    kIs: fluid.k ? ('ideal' as const) : undefined,
    psat: vapourPressure && [{ id: `${fluidId(fluid.id)}_ps1`, p: figureOf(vapourPressure) }],
    foamy: 'no' as const,
    hazards: hazardsOf(fluid),
  });
}
