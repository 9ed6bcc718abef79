'use client';

import { useId, useRef } from 'react';
import { buttonClass } from '@/components/ui/button-style';
import { cx } from '@/components/ui/cx';

/** Takes a picture with the phone's camera, or chooses files that are there. `documents` lets PDFs through. */
export function ChooseFiles({
  disabled,
  documents = false,
  onChoose,
}: {
  disabled: boolean;
  documents?: boolean;
  onChoose: (files: File[]) => void;
}) {
  const pictures = 'image/jpeg,image/png,image/webp,image/heic,image/heif';
  return (
    <div className="flex flex-wrap gap-2">
      <Choice
        label="Take a picture"
        accept="image/*"
        capture="environment"
        disabled={disabled}
        onChoose={onChoose}
      />
      <Choice
        label={documents ? 'Choose pictures or PDFs' : 'Choose pictures'}
        accept={documents ? `${pictures},application/pdf` : pictures}
        multiple
        disabled={disabled}
        onChoose={onChoose}
      />
    </div>
  );
}

function Choice({
  label,
  onChoose,
  ...rest
}: {
  label: string;
  accept: string;
  capture?: 'environment';
  multiple?: boolean;
  disabled: boolean;
  onChoose: (files: File[]) => void;
}) {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  return (
    <span className="relative inline-flex has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-sign">
      <label htmlFor={id} className={cx(buttonClass('secondary', 'normal', false), 'cursor-pointer')}>
        {label}
      </label>
      <input
        {...rest}
        ref={input}
        id={id}
        type="file"
        className="absolute inset-0 -z-10 opacity-0"
        onChange={() => {
          const chosen = [...(input.current?.files ?? [])];
          if (input.current) input.current.value = '';
          if (chosen.length > 0) onChoose(chosen);
        }}
      />
    </span>
  );
}
