import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const minimalDetectableChangePage: MethodPage = {
  slug: 'minimal-detectable-change',
  title: 'Measurement error: SEM and minimal detectable change',
  question: 'measurement',
  formula: ['SEM = s √(1 − ICC)', 'MDC = z √2 SEM, z = 1.959963984540054 for 95%'],
  whenUsed: 'Beside a minimal clinically important difference: one below the MDC cannot be told from measurement error.',
  smallN: 'Carries the uncertainty of SD and ICC, which is large in small samples.',
  source: 'Weir (2005) J Strength Cond Res 19:231-240.',
  computedBy: computations.absent,
};
