import { screen, within } from '@testing-library/react';
import { expect, it } from 'vitest';
import { licencesFile, type ShippedPackage } from '#shared/contracts/licences.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const aPackage = (change: Partial<ShippedPackage>): ShippedPackage => ({
  name: 'dunlin',
  version: '1.2.3',
  licence: 'MIT',
  browser: true,
  text: 'licence-texts/0123456789ab.txt',
  ...change,
});

it('lists the packages in the browser and on the server, each with its licence and its words', async () => {
  const { user } = (() => {
    signedInApi().on(licencesFile, () => ({
      packages: [
        aPackage({}),
        aPackage({ name: 'whimbrel', version: null, licence: 'ISC', browser: false, text: null }),
        aPackage({ name: 'curlew', version: null, browser: false, text: null }),
      ],
    }));
    return renderAt('/method');
  })();
  await user.click(await screen.findByRole('link', { name: 'Licences' }));
  const shipped = await screen.findByRole('table', { name: 'Packages in your browser' });
  const dunlin = within(shipped).getByRole('row', { name: /dunlin 1\.2\.3/ });
  expect(dunlin).toHaveTextContent('MIT');
  expect(within(dunlin).getByRole('link')).toHaveAttribute(
    'href',
    '/licence-texts/0123456789ab.txt',
  );
  await user.click(screen.getByText('2 packages'));
  const kept = screen.getByRole('table', { name: 'Packages on the server' });
  expect(within(kept).getByRole('row', { name: /whimbrel/ })).toHaveTextContent('ISC');
  expect(within(kept).queryByRole('link')).toBeNull();
  expect(screen.getByText(/SIL Open Font License 1\.1/)).toBeVisible();
});

it('says that the list cannot be loaded, and tries again', async () => {
  const api = signedInApi().on(licencesFile, () => new Refuse('unexpected'));
  const { user } = renderAt('/licences');
  const again = await screen.findByRole('button', { name: 'Try again' });
  api.on(licencesFile, () => ({ packages: [aPackage({})] }));
  await user.click(again);
  expect(await screen.findByText('dunlin')).toBeVisible();
});
