import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aPeoplePage, anInvitation, supervisorId } from '#tests/support/people.ts';
import { coachId, otherId } from '#tests/support/records.ts';
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

  it('lets a supervisor see the athletes of further coaches', async () => {
    const api = signedInApi('owner')
      .on(routes.people, () => aPeoplePage())
      .on(routes.changePerson, () => aPeoplePage());
    const { user } = renderAt('/practice/people');
    await user.click(await screen.findByRole('button', { name: 'Change Ines Falk' }));
    const dialog = screen.getByRole('dialog', { name: 'Ines Falk' });
    expect(within(dialog).getByLabelText('Maren Okafor')).toBeChecked();
    await user.click(within(dialog).getByLabelText('Tilda Marsh'));
    await user.click(within(dialog).getByRole('button', { name: 'Save' }));
    expect(api.calls(routes.changePerson)[0]).toMatchObject({
      params: { id: supervisorId },
      body: { role: 'supervisor', coachIds: [coachId, otherId] },
    });
  });

  it('hands a caseload to another coach, not to a supervisor', async () => {
    const api = signedInApi('owner')
      .on(routes.people, () => aPeoplePage())
      .on(routes.handOver, () => aPeoplePage());
    const { user } = renderAt('/practice/people');
    const name = 'Hand over the athletes of Maren Okafor';
    await user.click(await screen.findByRole('button', { name }));
    const select = screen.getByLabelText('Who takes them over');
    expect(within(select).queryByRole('option', { name: 'Ines Falk' })).toBeNull();
    await user.click(screen.getByRole('button', { name: 'Hand them over' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('Choose who takes the athletes');
    await user.selectOptions(select, 'Tilda Marsh');
    await user.click(screen.getByRole('button', { name: 'Hand them over' }));
    expect(await screen.findByText('4 athletes went to Tilda Marsh.')).toBeVisible();
    expect(api.calls(routes.handOver)[0]).toMatchObject({
      params: { id: coachId },
      body: { to: otherId },
    });
  });

  it('lets somebody in who lost phone and recovery codes, after a question', async () => {
    const page = aPeoplePage();
    const withCodes = {
      ...page,
      people: page.people.map((one) => ({ ...one, oneTimeCodes: one.id === supervisorId })),
    };
    const api = signedInApi('owner')
      .on(routes.people, () => withCodes)
      .on(routes.resetCodes, () => page);
    const { user } = renderAt('/practice/people');
    await user.click(await screen.findByRole('button', { name: 'Turn off codes of Ines Falk' }));
    const dialog = screen.getByRole('dialog', {
      name: 'Turn off the one-time codes of Ines Falk?',
    });
    await user.click(within(dialog).getByRole('button', { name: 'Turn off' }));
    expect(
      await screen.findByText(/Ines Falk signs in with the password alone/),
    ).toBeInTheDocument();
    expect(api.calls(routes.resetCodes)).toMatchObject([{ params: { id: supervisorId } }]);
    expect(screen.queryByRole('button', { name: /Turn off codes/ })).not.toBeInTheDocument();
  });

  it('says why the last owner stays', async () => {
    signedInApi('owner')
      .on(routes.people, () => aPeoplePage())
      .on(routes.deactivatePerson, () => new Refuse('last-owner'));
    const { user } = renderAt('/practice/people');
    await user.click(await screen.findByRole('button', { name: 'Deactivate Maren Holt' }));
    await user.click(screen.getByRole('button', { name: 'Deactivate' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('A practice needs an owner');
  });
});
