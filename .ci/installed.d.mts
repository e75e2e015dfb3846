export function missingPackages(folder: string): string[] | null;
