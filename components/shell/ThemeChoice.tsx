'use client';

import { useId, useState } from 'react';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { chooseTheme, parseTheme, type Theme } from '@/lib/client/theme';

const options = [
  { value: 'device', label: 'Device' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
];

/** Light, dark, or as the device says; kept in a cookie on this device. `theme` is what is in force now. */
export function ThemeChoice({ theme }: { theme: Theme }) {
  const [chosen, setChosen] = useState(theme);
  const name = useId();
  return (
    <RadioGroup
      name={name}
      label="Light or dark"
      look="segmented"
      options={options}
      value={chosen}
      onChange={(event) => {
        const next = parseTheme(event.target.value);
        setChosen(next);
        chooseTheme(next);
      }}
    />
  );
}
