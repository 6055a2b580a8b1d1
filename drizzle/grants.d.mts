export function grants(database: string, user: string): string[];
