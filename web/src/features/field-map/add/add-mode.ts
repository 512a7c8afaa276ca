/** The ways a field comes in. */
export const ADD_MODES = ['draw', 'type', 'pin', 'import'] as const;
export type AddMode = (typeof ADD_MODES)[number];

export function isAddMode(value: string | null): value is AddMode {
  return ADD_MODES.some((mode) => mode === value);
}
