import jsonld from 'jsonld';
import { describe, expect, it } from 'vitest';
import { milliseconds } from '#shared/timing/units.ts';
import { type Annotated, annotationCollection, urn } from './annotations.ts';

const OA = 'http://www.w3.org/ns/oa#';
const AS = 'http://www.w3.org/ns/activitystreams#';
const DCTERMS = 'http://purl.org/dc/terms/';

const link = (id: string) => ({ '@id': id, '@type': '@id' });
const word = (id: string) => ({ '@id': id, '@type': '@vocab' });
const dateTime = (id: string) => ({
  '@id': id,
  '@type': 'http://www.w3.org/2001/XMLSchema#dateTime',
});

/** The terms used, as the context http://www.w3.org/ns/anno.jsonld maps them (seen). */
const ANNO: jsonld.ContextDefinition = {
  id: '@id',
  type: '@type',
  Annotation: `${OA}Annotation`,
  TextualBody: `${OA}TextualBody`,
  FragmentSelector: `${OA}FragmentSelector`,
  SvgSelector: `${OA}SvgSelector`,
  Person: 'http://xmlns.com/foaf/0.1/Person',
  AnnotationCollection: `${AS}OrderedCollection`,
  AnnotationPage: `${AS}OrderedCollectionPage`,
  ...Object.fromEntries(
    ['commenting', 'replying', 'describing', 'identifying', 'tagging'].map((each) => [
      each,
      `${OA}${each}`,
    ]),
  ),
  motivation: word(`${OA}motivatedBy`),
  purpose: word(`${OA}hasPurpose`),
  body: link(`${OA}hasBody`),
  target: link(`${OA}hasTarget`),
  source: link(`${OA}hasSource`),
  selector: link(`${OA}hasSelector`),
  refinedBy: link(`${OA}refinedBy`),
  creator: link(`${DCTERMS}creator`),
  conformsTo: link(`${DCTERMS}conformsTo`),
  created: dateTime(`${DCTERMS}created`),
  modified: dateTime(`${DCTERMS}modified`),
  format: 'http://purl.org/dc/elements/1.1/format',
  value: 'http://www.w3.org/1999/02/22-rdf-syntax-ns#value',
  name: 'http://xmlns.com/foaf/0.1/name',
  label: 'http://www.w3.org/2000/01/rdf-schema#label',
  first: link(`${AS}first`),
  items: { ...link(`${AS}items`), '@container': '@list' as const },
  total: `${AS}totalItems`,
  startIndex: `${AS}startIndex`,
};

const load = (url: string) =>
  url === 'http://www.w3.org/ns/anno.jsonld'
    ? Promise.resolve({ documentUrl: url, document: { '@context': ANNO } })
    : Promise.reject(new Error(`Nothing but the annotation context is loaded, not ${url}.`));

const source = 'https://redshank.example/api/clips/c1/video';
const span = { from: milliseconds(3000), to: milliseconds(7000) };
const by = { id: urn('00000000-0000-4000-8000-0000000000b1'), name: 'Ines Holm' };
const id = (n: number) => urn(`00000000-0000-4000-8000-00000000000${n}`);

const comment: Annotated = {
  kind: 'comment',
  id: id(1),
  source,
  span,
  text: 'Watch the pelvis.',
  shape: { kind: 'ring', u: 320, v: 240, radius: 120 },
  answerTo: null,
  by,
  at: '2026-07-18T09:30:00.000Z',
  editedAt: '2026-07-18T09:31:00.000Z',
};
const ITEMS: readonly Annotated[] = [
  { kind: 'rep', id: id(2), source, span, label: 'Rep 1, standing on the left' },
  comment,
  { ...comment, id: id(3), text: 'Yes.', shape: null, answerTo: id(1), editedAt: null },
  { kind: 'mark', id: id(4), source, span, label: 'Belt pointer, tip', u: 640.25, v: 410.5 },
];

const expanded = async (items: readonly Annotated[]) => {
  const json = annotationCollection('https://redshank.example/api/reps/r1/annotations', 'A', items);
  // strict: a term that the standard's context does not know is a fault, not something to drop
  const options = { documentLoader: load, format: 'application/n-quads' as const, safe: true };
  return jsonld.toRDF(json, options) as Promise<string>;
};

describe('reps, marks and comments as web annotations', () => {
  it('says everything in terms of the standard, so that a general reader finds it', async () => {
    const quads = await expanded(ITEMS);
    const says = (predicate: string, object: string) =>
      quads.split(`<${predicate}> ${object} .`).length - 1;
    expect(says('http://www.w3.org/1999/02/22-rdf-syntax-ns#type', `<${OA}Annotation>`)).toBe(4);
    expect(says(`${OA}hasSource`, `<${source}>`)).toBe(4);
    for (const motivation of ['commenting', 'replying', 'describing', 'identifying'])
      expect(says(`${OA}motivatedBy`, `<${OA}${motivation}>`)).toBe(1);
    expect(says(`${OA}hasTarget`, `<${id(1)}>`)).toBe(1);
    expect(says(`${DCTERMS}creator`, `<${by.id}>`)).toBe(2);
    expect(says(`${DCTERMS}conformsTo`, '<http://www.w3.org/TR/media-frags/>')).toBe(4);
  });

  it('points at whole pixels for all readers and at the circle itself for those that draw', async () => {
    const quads = await expanded([comment]);
    expect(quads).toContain('"t=3,7&xywh=200,120,240,240"');
    expect(quads).toContain('circle cx=\\"320\\" cy=\\"240\\" r=\\"120\\"');
  });

  it('points at a stroke by the pixels that hold it and by the line itself', async () => {
    const points = [
      { u: 10.5, v: 20 },
      { u: 40, v: 60.25 },
    ];
    const quads = await expanded([{ ...comment, shape: { kind: 'stroke', points } }]);
    expect(quads).toContain('"t=3,7&xywh=10,20,30,41"');
    expect(quads).toContain('points=\\"10.5,20 40,60.25\\"');
  });

  it('names the measure that a comment shows, at its moment, without a region', async () => {
    const shape = { kind: 'measure', measure: 'lift' } as const;
    const quads = await expanded([{ ...comment, shape }]);
    expect(quads).toContain('"Lift of the thigh"');
    expect(quads).toContain(`<${OA}tagging>`);
    expect(quads).toContain('"t=3,7"');
    expect(await expanded([{ ...comment, shape: { ...shape, measure: 'gone' } }])).not.toContain(
      `<${OA}tagging>`,
    );
  });

  it('leaves out when a comment was changed where it never was', async () => {
    expect(await expanded([comment])).toContain('2026-07-18T09:31:00.000Z');
    expect(await expanded([{ ...comment, editedAt: null }])).not.toContain(`${DCTERMS}modified`);
  });

  it('counts what it holds, also nothing', () => {
    expect(annotationCollection('urn:x:1', 'Nothing yet', [])).toMatchObject({
      total: 0,
      first: { type: 'AnnotationPage', items: [] },
    });
  });
});
