export function appEnvironment({
  env,
  folder,
  secrets,
  databaseUrl,
  port,
  origin,
}: {
  env: Record<string, string | undefined>;
  folder: string;
  secrets: import('./secrets.mjs').Secrets;
  databaseUrl: string;
  port: number;
  origin: string;
}): Record<string, string | undefined>;
export function localOrigin(host: string | undefined, port: number): string;
