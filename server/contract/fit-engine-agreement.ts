import type {
  FitResult as EngineResult,
  FitSettings as EngineSettings,
  Reading,
  Spread,
} from '../../inversion';
import type { FitResult } from './fit-result';
import type { FitReading, FitSettings } from './fit-settings';
import type { spreadSchema } from './spread';
import type { z } from 'zod';

/**
 * The engine states its own shapes, because it imports nothing from here. These lines fail to compile when a shape of the
 * contract and its counterpart in the engine drift apart, in either direction.
 */
type Accepts<Target, Source extends Target> = Source;

export type EngineAgreement = [
  Accepts<FitResult, EngineResult>,
  Accepts<EngineResult, FitResult>,
  Accepts<EngineSettings, FitSettings>,
  Accepts<Reading, FitReading>,
  Accepts<Spread, z.infer<typeof spreadSchema>>,
];
