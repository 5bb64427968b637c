import { render, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { FILMING_LIMITS } from '#shared/measures/filming-limits.ts';
import { MEASURES } from '#shared/measures/registry.ts';
import { MethodPage } from './method-page.tsx';

describe('the method page', () => {
  it('lists every measure of the registry and every number of the engine with its source', () => {
    render(<MethodPage />);
    const measures = screen.getByRole('table', { name: 'Measures' });
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
});
