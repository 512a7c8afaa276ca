import type { Occluder } from '@furrowlight/shared/contract/fields';

export const OCCLUDER_KINDS: Record<Occluder['kind'], string> = {
  hedge: 'Hedge',
  wood: 'Wood',
  building: 'Building',
};
