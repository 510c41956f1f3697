/** Waits until all have settled, and only then throws what the first that failed threw: nothing runs on behind an error. */
export async function allDone(work: readonly Promise<unknown>[]): Promise<void> {
  const settled = await Promise.allSettled(work);
  const failed = settled.find((one) => one.status === 'rejected');
  if (failed !== undefined) throw failed.reason;
}
