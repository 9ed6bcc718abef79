import { RadioGroup } from '@/components/ui/RadioGroup';
import { Textarea } from '@/components/ui/Textarea';
import { TextInput } from '@/components/ui/TextInput';
import { fieldError, type Failure } from '@/lib/client/api';
import { Disclosure } from './Disclosure';
import type { Typed } from './entry';

/** A fault seen when the unit came back. Unless somebody says otherwise it holds the unit. */
export function DefectFields({
  typed,
  onChange,
  failure,
}: {
  typed: Typed;
  onChange: (part: Partial<Typed>) => void;
  failure: Failure | null;
}) {
  return (
    <Disclosure label="Report a defect" open={typed.faulty} onToggle={(faulty) => onChange({ faulty })}>
      <TextInput
        name="defect.title"
        label="What is wrong"
        large
        maxLength={120}
        autoComplete="off"
        value={typed.title}
        onChange={(event) => onChange({ title: event.target.value })}
        error={fieldError(failure, 'defect.title')}
      />
      <Textarea
        name="defect.detail"
        label="More about it"
        optional
        rows={3}
        maxLength={2000}
        value={typed.detail}
        onChange={(event) => onChange({ detail: event.target.value })}
        error={fieldError(failure, 'defect.detail')}
      />
      <RadioGroup
        name="holdsUnit"
        label="May it go out with this?"
        large
        options={[
          {
            value: 'held',
            label: 'No, hold it',
            hint: 'It may not be hired out until a mechanic has seen to it.',
          },
          { value: 'fit', label: 'Yes, it is safe to hire out', hint: 'The mechanic is told all the same.' },
        ]}
        value={typed.holdsUnit ? 'held' : 'fit'}
        onChange={(event) => onChange({ holdsUnit: event.target.value === 'held' })}
      />
    </Disclosure>
  );
}
