import type { Field } from '@furrowlight/shared/contract/fields';

/** Fields of a farm whose name or farm holds every word of the query, by farm and name. */
export function fieldsMatching(
  fields: readonly Field[],
  query: string,
  farmId: string | null,
): Field[] {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  return fields
    .filter((field) => {
      if (farmId && field.farmId !== farmId) return false;
      const text = `${field.name} ${field.farmName}`.toLowerCase();
      return words.every((word) => text.includes(word));
    })
    .sort((a, b) => a.farmName.localeCompare(b.farmName) || a.name.localeCompare(b.name));
}
