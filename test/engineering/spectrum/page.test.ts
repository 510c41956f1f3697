import { expect, it } from 'vitest';
import { spectraPage } from '../../support/spectra-page.js';

// After a change of the register: npx vitest run -u test/engineering/spectrum/page.test.ts
it('docs/spectra.md says what the register holds', async () => {
  await expect(spectraPage()).toMatchFileSnapshot('../../../docs/spectra.md');
});
