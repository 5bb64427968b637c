import { screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aClip, anAthlete, aVisit, clipId, visitId } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const opened = (clips = [aClip()]) => {
  const api = signedInApi()
    .on(routes.visit, () => ({ visit: aVisit(), clips }))
    .on(routes.athlete, () => anAthlete())
    .on(routes.listSetUps, () => ({ items: [] }))
    .on(routes.listCalls, () => ({ items: [] }));
  return { api, ...renderAt(`/visits/${visitId}`) };
};

/** What the browser was given to keep. */
const kept = () => {
  const blobs: Blob[] = [];
  const names: string[] = [];
  vi.stubGlobal(
    'URL',
    Object.assign(URL, {
      createObjectURL: (blob: Blob) => `blob:${blobs.push(blob)}`,
      revokeObjectURL: () => undefined,
    }),
  );
  vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (
    this: HTMLAnchorElement,
  ) {
    names.push(this.download);
  });
  return { blobs, names };
};
afterEach(() => vi.restoreAllMocks());

describe('taking a visit away', () => {
  it('keeps the table under the name that the server gave it', async () => {
    const { blobs, names } = kept();
    const { api, user } = opened();
    api.on(
      routes.visitFrames,
      () =>
        new Response('rep,frame\r\n1,7\r\n', {
          headers: { 'content-disposition': 'attachment; filename="2026-07-18-visit.csv"' },
        }),
    );
    const files = await screen.findByRole('region', { name: 'Take it away' });
    await user.click(within(files).getByRole('button', { name: /^Save: Values and marks/ }));
    await vi.waitFor(() => expect(names).toEqual(['2026-07-18-visit.csv']));
    expect(await blobs[0]?.text()).toBe('rep,frame\r\n1,7\r\n');
    expect(api.calls(routes.visitFrames)[0]?.params).toEqual({ id: visitId });
  });

  it('says in words what comes first, and keeps no file of it', async () => {
    const { names } = kept();
    const { api, user } = opened();
    api.on(routes.visitFrames, () => new Refuse('call-first'));
    const files = await screen.findByRole('region', { name: 'Take it away' });
    await user.click(within(files).getByRole('button', { name: /^Save: Values and marks/ }));
    expect(await within(files).findByRole('alert')).toHaveTextContent(
      'Record your call by eye first.',
    );
    expect(names).toEqual([]);
  });

  it('offers the comments of each clip that is ready, and nothing before one is', async () => {
    const { api, user } = opened([aClip(), aClip({ id: visitId, state: 'preparing' })]);
    kept();
    api.on(routes.clipComments, () => new Response('WEBVTT\n'));
    const files = await screen.findByRole('region', { name: 'Take it away' });
    const tracks = within(files).getAllByRole('button', { name: /^Save: Comments on/ });
    expect(tracks).toHaveLength(1);
    const [track] = tracks;
    if (track) await user.click(track);
    await vi.waitFor(() =>
      expect(api.calls(routes.clipComments)[0]?.params).toEqual({ id: clipId }),
    );
  });

  it('is not offered before any clip is ready', async () => {
    opened([aClip({ state: 'preparing' })]);
    expect(await screen.findByRole('region', { name: '5 Call by eye' })).toBeVisible();
    expect(screen.queryByRole('region', { name: 'Take it away' })).toBeNull();
  });
});
