import { describe, expect, it } from 'vitest';
import { cameraStoodOf, viewOf } from './views.ts';

describe('where the camera stood', () => {
  it.each([
    ['front', 'left', 'front'],
    ['back', null, 'back'],
    ['support-side', 'left', 'athlete-left'],
    ['support-side', 'right', 'athlete-right'],
    ['lifted-side', 'right', 'athlete-left'],
    ['lifted-side', 'left', 'athlete-right'],
    ['lifted-side', null, null],
  ] as const)('%s, standing on the %s: %s', (view, support, stood) => {
    expect(cameraStoodOf(view, support)).toBe(stood);
  });

  it('gives each rep of one take its own view', () => {
    expect(viewOf('athlete-left', 'left')).toBe('support-side');
    expect(viewOf('athlete-left', 'right')).toBe('lifted-side');
    expect(viewOf('front', 'right')).toBe('front');
  });
});
