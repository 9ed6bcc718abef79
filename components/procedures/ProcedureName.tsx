import { Section } from '@/components/rules/Section';
import { kindWords } from '@/components/task/task-words';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { TextInput } from '@/components/ui/TextInput';
import { PROCEDURE_KINDS, type Procedure } from '@/lib/schemas/procedure';

const KINDS = PROCEDURE_KINDS.map((value) => ({ value, label: kindWords[value] }));

interface Named {
  name: string;
  kind: Procedure['kind'];
  note: string;
}

/** What a procedure is called and what kind of work it is; a later version also says what is new in it. */
export function ProcedureName({
  name,
  kind,
  note,
  error,
  onChange,
}: {
  name: string;
  kind: Procedure['kind'];
  /** `null` for a first version. */
  note: string | null;
  error: (path: string) => string | undefined;
  onChange: (part: Partial<Named>) => void;
}) {
  return (
    <Section title="What it is">
      <TextInput
        id="name"
        label="Name"
        maxLength={80}
        value={name}
        error={error('name')}
        onChange={(event) => onChange({ name: event.target.value })}
      />
      <RadioGroup
        name="kind"
        label="Kind"
        look="segmented"
        options={KINDS}
        value={kind}
        error={error('kind')}
        onChange={(event) => onChange({ kind: event.target.value as Procedure['kind'] })}
      />
      {note === null ? null : (
        <TextInput
          id="note"
          label="What is new in this version"
          hint="Tasks that are open keep the version they were opened with."
          optional
          maxLength={500}
          value={note}
          error={error('note')}
          onChange={(event) => onChange({ note: event.target.value })}
        />
      )}
    </Section>
  );
}
