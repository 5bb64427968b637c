import type { Shape } from '#shared/contracts/comments.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { measureById } from '#shared/measures/registry.ts';
import {
  boxFragment,
  type Corner,
  type ClipSpan,
  regionFragment,
  timeFragment,
} from './media-fragment.ts';

export interface AnnotatedPerson {
  /** IRI. */
  readonly id: string;
  readonly name: string;
}

interface Placed {
  /** Its own IRI. */
  readonly id: string;
  readonly span: ClipSpan;
  /** Address of the clip's video. */
  readonly source: string;
}

/** A comment with where it points; an answer names the comment it answers. */
export interface AnnotatedComment extends Placed {
  readonly kind: 'comment';
  readonly text: string;
  readonly shape: Shape | null;
  /** IRI of the comment it answers. */
  readonly answerTo: string | null;
  readonly by: AnnotatedPerson;
  readonly at: string;
  readonly editedAt: string | null;
}

/** A rep: a span of the clip and what it is called. */
export interface AnnotatedRep extends Placed {
  readonly kind: 'rep';
  readonly label: string;
}

/** A landmark placed on one frame. */
export interface AnnotatedMark extends Placed {
  readonly kind: 'mark';
  readonly label: string;
  readonly u: number;
  readonly v: number;
}

export type Annotated = AnnotatedComment | AnnotatedRep | AnnotatedMark;

type Json = { readonly [key: string]: unknown };

const MEDIA_FRAGMENTS = 'http://www.w3.org/TR/media-frags/';
const SVG = 'http://www.w3.org/TR/SVG11/';

/** The IRI of a row: RFC 9562. */
export const urn = (id: string): string => `urn:uuid:${id}`;

/** A mark is a point; a region must have a size. */
const POINT_RADIUS = 1;

const svg = (inside: string): Json => ({
  type: 'SvgSelector',
  conformsTo: SVG,
  value: `<svg xmlns="http://www.w3.org/2000/svg">${inside}</svg>`,
});

const circle = (u: number, v: number, radius: number): Json =>
  svg(`<circle cx="${u}" cy="${v}" r="${radius}"/>`);

const polyline = (points: readonly Corner[]): Json =>
  svg(`<polyline fill="none" points="${points.map(({ u, v }) => `${u},${v}`).join(' ')}"/>`);

interface Region {
  readonly pixels: string;
  readonly drawn: Json;
}

/** Whole pixels for every reader, and what was drawn, to a fraction of a pixel, for those who can. */
const selector = (span: ClipSpan, at: Region | null): Json => {
  const time = timeFragment(span);
  const fragment = { type: 'FragmentSelector', conformsTo: MEDIA_FRAGMENTS };
  if (!at) return { ...fragment, value: time };
  return { ...fragment, value: `${time}&${at.pixels}`, refinedBy: at.drawn };
};

const round = (u: number, v: number, radius: number): Region => ({
  pixels: regionFragment(framePoint(u, v), radius),
  drawn: circle(u, v, radius),
});

const regionOf = (item: Annotated): Region | null => {
  if (item.kind === 'mark') return round(item.u, item.v, POINT_RADIUS);
  if (item.kind === 'rep' || !item.shape) return null;
  const { shape } = item;
  // taken from the marks of its frame, which are listed by themselves
  if (shape.kind === 'measure') return null;
  if (shape.kind === 'stroke')
    return { pixels: boxFragment(shape.points), drawn: polyline(shape.points) };
  return round(shape.u, shape.v, shape.kind === 'ring' ? shape.radius : POINT_RADIUS);
};

const textBody = (value: string, purpose: string): Json => ({
  type: 'TextualBody',
  value,
  format: 'text/plain',
  purpose,
});

const about = (item: Annotated): Json => {
  if (item.kind === 'rep')
    return { motivation: 'describing', body: textBody(item.label, 'describing') };
  if (item.kind === 'mark')
    return { motivation: 'identifying', body: textBody(item.label, 'identifying') };
  const motivation = item.answerTo === null ? 'commenting' : 'replying';
  const text = textBody(item.text, motivation);
  const measured = item.shape?.kind === 'measure' ? measureById(item.shape.measure) : null;
  return {
    motivation,
    creator: { id: item.by.id, type: 'Person', name: item.by.name },
    created: item.at,
    ...(item.editedAt === null ? {} : { modified: item.editedAt }),
    body: measured === null ? text : [text, textBody(measured.label, 'tagging')],
  };
};

const annotation = (item: Annotated): Json => {
  const place = { source: item.source, selector: selector(item.span, regionOf(item)) };
  const answered = item.kind === 'comment' ? item.answerTo : null;
  return {
    id: item.id,
    type: 'Annotation',
    ...about(item),
    target: answered === null ? place : [answered, place],
  };
};

/**
 * Reps, marks and comments as a W3C Web Annotation collection (Recommendation of 2017) of one page.
 * @param id the collection's own address
 */
export const annotationCollection = (
  id: string,
  label: string,
  items: readonly Annotated[],
): Json => ({
  '@context': 'http://www.w3.org/ns/anno.jsonld',
  id,
  type: 'AnnotationCollection',
  label,
  total: items.length,
  first: {
    id: `${id}#page-1`,
    type: 'AnnotationPage',
    startIndex: 0,
    items: items.map(annotation),
  },
});
