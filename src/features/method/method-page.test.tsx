import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { ACHIEVED } from '#shared/measures/achieved.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { FILMING_LIMITS } from '#shared/measures/filming-limits.ts';
import { MEASURES } from '#shared/measures/registry.ts';
import { CURRENT_ENGINE } from '#shared/reading/engine.ts';
import { aProtocol, aProtocolPage } from '#tests/support/protocol.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';
import { routes } from '#shared/contracts/routes.ts';
import { degrees } from '#shared/geometry/units.ts';
import { STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';

describe('the method page', () => {
  it('lists every measure of the registry and every number of the engine with its source', async () => {
    signedInApi();
    renderAt('/method');
    const measures = await screen.findByRole('table', { name: 'Measures' });
    for (const { label, source } of MEASURES) {
      expect(within(measures).getByText(label)).toBeInTheDocument();
      expect(within(measures).getAllByText(source).length).toBeGreaterThan(0);
    }
    const numbers = screen.getByRole('table', { name: 'Constants' });
    for (const { meaning } of Object.values(CONSTANTS))
      expect(within(numbers).getByText(meaning)).toBeInTheDocument();
    const limits = screen.getByRole('table', { name: 'Limits of filming' });
    for (const { meaning } of Object.values(FILMING_LIMITS))
      expect(within(limits).getByText(meaning)).toBeInTheDocument();
  });

  it('writes the practice’s own gates and limits', async () => {
    const values = { ...STANDARD_PROTOCOL, gateFrom: degrees(55), early: 0.975 };
    signedInApi().on(routes.protocol, () => aProtocolPage(aProtocol({ values })));
    renderAt('/method');
    expect(await screen.findByText(/from 55° to 90° of lift/)).toBeVisible();
    expect(screen.getByText(/needs 97.5 in 100 for turning out early/)).toBeVisible();
  });

  it('says how often readings are right, with every landmark set, and which engine reads', async () => {
    signedInApi();
    renderAt('/method');
    const achieved = await screen.findByRole('table', { name: 'How often readings are right' });
    for (const { falseEarly } of Object.values(ACHIEVED)) {
      const { hits, of } = falseEarly.harder;
      expect(
        within(achieved).getAllByText(new RegExp(`\\(${hits} of ${of}\\)`)).length,
      ).toBeGreaterThan(0);
    }
    expect(screen.getByText(new RegExp(`this is engine ${CURRENT_ENGINE}`))).toBeInTheDocument();
  });
});
