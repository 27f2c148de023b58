/* Method e.fire-insulation: the environment factor of insulation and the heat input with it. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { FIRE_FORMS, fireHeat, insulationFactor } from './heat';

const CLAUSE = 'API 521, environment factor';

/** The step that gives F from insulation, in SI; used here and by the wetted-fire sheet. */
export function insulationStep(sheet: SheetBuilder): number {
  const k = sheet.number('k_ins', 'W/(m.K)', { above: 0 }, 'k');
  const T = sheet.number('T_process', 'degC', {}, 'T_f');
  const thickness = sheet.number('thickness', 'm', { above: 0 }, '\\delta');
  const { flame, insulation } = FIRE_FORMS.SI;
  if (T >= flame)
    sheet.refuse(
      'VALUE_IMPOSSIBLE',
      'T_process',
      `The process temperature is not below the flame temperature of ${flame} °C: insulation gives no credit.`,
    );
  const F = sheet.step(
    {
      key: 'F',
      meaning: 'environment factor of the insulation, not above 1',
      value: insulationFactor(k, T, thickness),
      unit: '-',
      clause: CLAUSE,
      memory: true,
    },
    (v) =>
      `\\min\\left(1, \\frac{${v('k_ins')} \\cdot (${flame} - ${v('T_process')})}{${insulation} \\cdot ${v('thickness')}}\\right)`,
  );
  return F;
}

/** e.fire-insulation: F for insulation and the heat input. */
export const FIRE_INSULATION: Method = {
  id: 'e.fire-insulation',
  version: 1,
  topic: 'e.fire-insulation',
  title: 'Environment factor of insulation in a fire',
  editions: ['API 521, 5th to 7th edition'],
  source: 'API Standard 521, environment factor F = k (904 − Tf)/(66 570 t) (from memory)',
  validity:
    'Insulation that withstands 904 °C for the time of the fire and is not dislodged by hose streams; k at the mean temperature.',
  inputs: [
    input('k_ins', 'conductivity of the insulation', 'heat-conductivity', {
      rangeKey: 'insulationConductivity',
    }),
    input('T_process', 'process temperature at relief', 'temperature', { rangeKey: 'relievingTemperature' }),
    input('thickness', 'thickness of the insulation', 'length', { rangeKey: 'insulationThickness' }),
    input('A', 'wetted area', 'area', { rangeKey: 'wettedArea' }),
    optional('adequate_drainage', 'whether drainage and fire fighting are adequate (yes when not given)'),
  ],
  outputs: [output('F', 'environment factor', 'dimensionless'), output('heat_input', 'heat input', 'power')],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const A = sheet.number('A', 'm2', { above: 0 });
      const F = insulationStep(sheet);
      const drained = sheet.flag('adequate_drainage', true);
      const constant = drained ? FIRE_FORMS.SI.drained : FIRE_FORMS.SI.undrained;
      const heat = sheet.step(
        {
          key: 'q',
          meaning: 'heat absorbed from the fire',
          value: fireHeat(A, F, drained, 'SI'),
          unit: 'W',
          clause: 'API 521, heat absorption of wetted surfaces',
          memory: true,
        },
        (v) => `${constant} \\cdot ${v('F')} \\cdot ${v('A')}^{0.82}`,
      );
      sheet.output('F', F);
      sheet.output('heat_input', heat, 'W');
    });
  },
};
