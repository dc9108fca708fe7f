/** Why the server could not start: a sentence on what to mend where the cause is known, else the error with its stack. */
export function startFailure(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  const code = 'code' in error ? error.code : undefined;
  if (code === 'EADDRINUSE') {
    const port = 'port' in error ? ` ${String(error.port)}` : '';
    return `Port${port} is taken. Stop what uses it, or set PORT to another number.`;
  }
  if (code === 'EACCES' || code === 'EROFS') {
    const place = 'path' in error ? ` ${String(error.path)}` : '';
    return `No permission to write${place}. Set HOLDWATER_DATA to a folder of yours, or PORT to 1024 or more.`;
  }
  if (error.message.startsWith('The environment cannot be used.')) return error.message;
  return error.stack ?? error.message;
}
