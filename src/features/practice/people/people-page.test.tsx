import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aPeoplePage, anInvitation } from '#tests/support/people.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

describe('the people of a practice', () => {
  it('shows an owner who is here, who sees whom, and that nobody is invited', async () => {
    signedInApi('owner').on(routes.people, () => aPeoplePage());
    renderAt('/practice/people');
    const table = await screen.findByRole('table', { name: 'People' });
    expect(within(table).getByRole('row', { name: /Ines Falk/ })).toHaveTextContent(
      /Supervisor.*of Maren Okafor/,
    );
    expect(within(table).getByRole('row', { name: /Tilda Marsh/ })).toHaveTextContent('never');
    expect(screen.getByText('Nobody')).toBeVisible();
  });

  it('invites, and says of a letter that it is not sent yet', async () => {
    const api = signedInApi('owner')
      .on(routes.people, () => aPeoplePage())
      .on(routes.invite, () => aPeoplePage({ invitations: [anInvitation({ sentAt: null })] }));
    const { user } = renderAt('/practice/people');
    await user.type(await screen.findByLabelText('E-mail'), 'wren@test.example');
    await user.selectOptions(screen.getByLabelText('Role'), 'supervisor');
    await user.click(screen.getByRole('button', { name: 'Send the invitation' }));
    const table = await screen.findByRole('table', { name: 'Open invitations' });
    expect(table).toHaveTextContent('not sent yet');
    expect(api.calls(routes.invite)[0]?.body).toEqual({
      email: 'wren@test.example',
      role: 'supervisor',
    });
    expect(screen.getByLabelText('E-mail')).toHaveValue('');
  });

  it('says at the field that somebody is here already', async () => {
    const message = 'There is an account of this practice with this address.';
    signedInApi('owner')
      .on(routes.people, () => aPeoplePage())
      .on(
        routes.invite,
        () => new Refuse('invalid-input', { faults: [{ path: 'body.email', message }] }),
      );
    const { user } = renderAt('/practice/people');
    await user.type(await screen.findByLabelText('E-mail'), 'wren@test.example');
    await user.click(screen.getByRole('button', { name: 'Send the invitation' }));
    expect(await screen.findByRole('alert')).toHaveTextContent(message);
    expect(screen.getByLabelText('E-mail')).toBeInvalid();
  });

  it('ends an invitation once that was confirmed', async () => {
    let open = true;
    const api = signedInApi('owner')
      .on(routes.people, () => aPeoplePage({ invitations: open ? [anInvitation()] : [] }))
      .on(routes.withdrawInvitation, () => {
        open = false;
        return undefined;
      });
    const { user } = renderAt('/practice/people');
    await user.click(await screen.findByRole('button', { name: 'End' }));
    expect(api.calls(routes.withdrawInvitation)).toHaveLength(0);
    await user.click(screen.getByRole('button', { name: 'End it' }));
    expect(await screen.findByText('Nobody')).toBeVisible();
    expect(api.calls(routes.withdrawInvitation)[0]?.params.id).toBe(anInvitation().id);
  });

  it('is not for coaches, who are told whose it is and ask the server nothing', async () => {
    const api = signedInApi('coach');
    renderAt('/practice/people');
    expect(await screen.findByText(/The owner of Greywater Row invites people/)).toBeVisible();
    expect(api.calls(routes.people)).toHaveLength(0);
  });

  it('that cannot be loaded says so and tries again', async () => {
    let down = true;
    signedInApi('owner').on(routes.people, () => (down ? new Refuse('unexpected') : aPeoplePage()));
    const { user } = renderAt('/practice/people');
    expect(await screen.findByRole('alert')).toHaveTextContent('went wrong');
    down = false;
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('table', { name: 'People' })).toBeVisible();
  });
});
