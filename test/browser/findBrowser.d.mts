export function findBrowser(): string | null;
export function ensureBrowser(): { path: string | null; advice: string };
