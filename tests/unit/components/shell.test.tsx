// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, expect, test } from 'vitest';
import { LagLine, lagText } from '@/components/shell/LagLine';
import { splitNav } from '@/components/shell/nav';
import { ThemeChoice } from '@/components/shell/ThemeChoice';
import { parseTheme, themeCookie } from '@/lib/client/theme';

afterEach(cleanup);

const nav = (count: number) =>
  Array.from({ length: count }, (_, index) => ({ href: `/${index}`, label: `${index}`, current: false }));

test('a phone shows three destinations and puts the rest behind More; four just fit', () => {
  expect(splitNav(nav(4)).bar).toHaveLength(4);
  expect(splitNav(nav(4)).more).toHaveLength(0);
  expect(splitNav(nav(5)).bar).toHaveLength(3);
  expect(splitNav(nav(5)).more).toHaveLength(2);
});

test.each([
  [1, '1 second'],
  [45, '45 seconds'],
  [119, '119 seconds'],
  [120, '2 minutes'],
  [7_199, '119 minutes'],
  [7_200, '2 hours'],
])('a lag of %s seconds reads as "%s"', (seconds, text) => {
  expect(lagText(seconds)).toBe(text);
});

test('a worker that keeps up is not mentioned', () => {
  const { container, rerender } = render(<LagLine seconds={null} />);
  expect(container.textContent).toBe('');
  rerender(<LagLine seconds={190} />);
  expect(screen.getByRole('status').textContent).toContain('3 minutes behind');
});

test('a chosen theme shows at once and is kept; the device takes over again on request', () => {
  render(<ThemeChoice theme="device" />);
  fireEvent.click(screen.getByRole('radio', { name: 'Dark' }));
  expect(document.documentElement.dataset.theme).toBe('dark');
  expect(document.cookie).toContain(`${themeCookie}=dark`);
  fireEvent.click(screen.getByRole('radio', { name: 'Device' }));
  expect(document.documentElement.dataset.theme).toBeUndefined();
});

test('an unknown theme in the cookie counts as no choice', () => {
  expect(parseTheme('dark')).toBe('dark');
  expect(parseTheme('sepia')).toBe('device');
  expect(parseTheme(undefined)).toBe('device');
});
