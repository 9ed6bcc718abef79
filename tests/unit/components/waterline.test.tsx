// @vitest-environment happy-dom
import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, expect, test } from 'vitest';
import { DockWaterline } from '@/components/waterline/DockWaterline';
import type { WaterlineUnit } from '@/components/waterline/geometry';
import { limitText, shortAmount } from '@/components/waterline/text';
import { Waterline } from '@/components/waterline/Waterline';

afterEach(cleanup);

const base = { fleetNumber: 'NB-07', state: 'ready' } as const;
const unit = (tenthsToHold: number | null, daysToHold: number | null): WaterlineUnit => ({
  ...base,
  tenthsToHold,
  daysToHold,
});

test.each([
  [124, 9, '12.4 h or 9 days left before its next hold, whichever comes first'],
  [124, null, '12.4 h left before its next hold'],
  [null, 1, '1 day left before its next hold'],
  [0, null, '0.0 h left before its next hold'],
  [-32, 40, '3.2 h past its hold point'],
  [-32, -4, '3.2 h and 4 days past its hold point'],
  [null, null, 'no hold ahead'],
])('%s tenths and %s days read as "%s"', (tenths, days, text) => {
  expect(limitText(unit(tenths, days))).toBe(text);
});

test.each([
  [124, 90, '12.4 h'],
  [900, 3, '3 d'],
  [-32, null, '−3.2 h'],
  [null, null, '–'],
])('%s tenths and %s days are written as "%s" beside the hull', (tenths, days, text) => {
  expect(shortAmount(unit(tenths, days))).toBe(text);
});

test('a unit says in words what its picture shows', () => {
  render(<Waterline unit={{ ...base, state: 'held', tenthsToHold: 60, daysToHold: -3 }} />);
  expect(screen.getByText('NB-07, held: 3 days past its hold point')).toBeTruthy();
});

test('each unit of a dock is a link that says where it stands', () => {
  render(
    <DockWaterline
      label="North Basin"
      units={[
        { ...base, href: '/units/7', tenthsToHold: 124, daysToHold: null },
        { ...base, fleetNumber: 'NB-08', tenthsToHold: null, daysToHold: null },
      ]}
    />,
  );
  const link = screen.getByRole('link', { name: 'NB-07, ready: 12.4 h left before its next hold' });
  expect(link.getAttribute('href')).toBe('/units/7');
  expect(screen.getAllByRole('link')).toHaveLength(1);
  expect(screen.getByText('NB-08, ready: no hold ahead')).toBeTruthy();
});
