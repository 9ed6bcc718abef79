import type { DueState, UnitState } from './state-words';

const onLine = <path d="M0 12.5h20" stroke="currentColor" strokeWidth="2" />;

/**
 * The mark of a state in a 20 by 20 box, told apart without colour: unit states are a tick on a disc, a
 * pennant and a barred square; due states are a weight that sinks through a water line.
 */
export function StateShape({ state }: { state: UnitState | DueState }) {
  switch (state) {
    case 'ready':
      return (
        <path
          fillRule="evenodd"
          fill="currentColor"
          d="M10 0a10 10 0 1 0 0 20 10 10 0 0 0 0-20Zm5.9 6.6-7.2 8.6-4.6-4.5 1.7-1.8 2.8 2.7 5.4-6.5Z"
        />
      );
    case 'out':
      return (
        <>
          <path d="M3 0v20" stroke="currentColor" strokeWidth="2.5" />
          <path
            d="M4 1.5 19 7 4 12.5Z"
            fill="none"
            stroke="currentColor"
            strokeWidth="2.2"
            strokeLinejoin="round"
          />
        </>
      );
    case 'held':
      return <path fillRule="evenodd" fill="currentColor" d="M1 1h18v18H1ZM4 8v4h12V8Z" />;
    case 'clear':
      return (
        <>
          <circle cx="10" cy="5" r="3.8" fill="none" stroke="currentColor" strokeWidth="2" />
          <path d="M0 17h20" stroke="currentColor" strokeWidth="2" />
        </>
      );
    case 'upcoming':
      return (
        <>
          <circle cx="10" cy="9" r="4.8" fill="none" stroke="currentColor" strokeWidth="2" />
          <path d="M10 4.2a4.8 4.8 0 0 1 0 9.6Z" fill="currentColor" />
          <path d="M0 17h20" stroke="currentColor" strokeWidth="2" />
        </>
      );
    case 'due':
      return (
        <>
          <path d="M10 3.5 18 11.5l-8 8-8-8Z" fill="currentColor" />
          {onLine}
        </>
      );
    case 'overdue':
      return (
        <>
          <path d="M0 2.5h20" stroke="currentColor" strokeWidth="2.5" />
          <path d="M1 6.5h18L10 20Z" fill="currentColor" />
        </>
      );
  }
}
