/** The folder of temporary-setup.ts. */
export function testRoot(): string {
  const root = process.env['SWAYMARK_TEST_ROOT'];
  if (root === undefined) throw new Error('test/support/temporary-setup.ts is not among the global set-ups');
  return root;
}
