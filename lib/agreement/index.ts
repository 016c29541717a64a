export {
  chancePricedNext,
  conformanceProbability,
  globalRisks,
  type Limits,
  type ReadBand,
} from './conformity';
export type { ReadProcess } from './joint-normal';
export { combineUncertainties, uncertaintyOfGraduation, uncertaintyOfLimits } from './uncertainty';
