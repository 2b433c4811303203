/** Ids of the method marks struck, from one text with commas as a reading keeps it. Ours, no source. struckIds('a,b') is ['a', 'b']; struckIds('') is []. */
export const struckIds = (method: string): string[] => (method === '' ? [] : method.split(','));
