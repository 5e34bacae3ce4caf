'use client';

import { CONTROL_STYLE, Field } from '@/components/ui/field';
import { InlineQuantity } from '@/components/ui/inline-quantity';
import { SelectField, type SelectOption } from '@/components/ui/select-field';
import type { DraftAccess } from './draft-access';
import { textOf } from './draft-value';
import { useTyped } from './use-typed';

interface FieldProps {
  draft: DraftAccess;
  /** JSON Pointer of the place in the document */
  pointer: string;
  label: string;
  hint?: string;
}

/** A text of the document. `lines` above 1 makes it a text area; an optional one is taken away when it is emptied. */
export function TextAt({
  draft,
  pointer,
  label,
  hint,
  lines = 1,
  optional = false,
}: FieldProps & { lines?: number; optional?: boolean }) {
  const change = ({ target }: { target: { value: string } }) =>
    draft.set(pointer, optional && target.value === '' ? undefined : target.value);
  const value = textOf(draft.at(pointer));
  return (
    <Field label={label} hint={hint} error={draft.errorAt(pointer)}>
      {(tie) =>
        lines === 1 ? (
          <input
            {...tie}
            data-pointer={pointer}
            type="text"
            autoComplete="off"
            value={value}
            onChange={change}
            className={CONTROL_STYLE}
          />
        ) : (
          <textarea
            {...tie}
            data-pointer={pointer}
            rows={lines}
            value={value}
            onChange={change}
            className={`${CONTROL_STYLE} resize-y py-1`}
          />
        )
      }
    </Field>
  );
}

/** One of a few words of the document; what stands there and is none of them stays to be seen. */
export function ChoiceAt({
  draft,
  pointer,
  label,
  hint,
  options,
}: FieldProps & { options: readonly SelectOption[] }) {
  const value = textOf(draft.at(pointer));
  const isKnown = options.some((option) => option.value === value);
  const other = { value, label: value === '' ? 'choose' : `${value}: none of these` };
  return (
    <SelectField
      data-pointer={pointer}
      label={label}
      hint={hint}
      error={draft.errorAt(pointer)}
      value={value}
      options={isKnown ? options : [other, ...options]}
      onChange={({ target }) => draft.set(pointer, target.value)}
    />
  );
}

interface QuantityAtProps {
  draft: DraftAccess;
  /** of the statement, whose members are `value`, `u` and `unit` */
  pointer: string;
  name: string;
  units?: readonly SelectOption[];
  onUnit?: (unit: string) => void;
}

/** value ± u unit of a statement of the document, in one line. */
export function QuantityAt({ draft, pointer, name, units, onUnit }: QuantityAtProps) {
  const value = useTyped(draft, `${pointer}/value`);
  const u = useTyped(draft, `${pointer}/u`);
  const places = ['', '/value', '/u', '/unit', '/orientation'].map((member) => pointer + member);
  return (
    <div data-pointer={pointer}>
      <InlineQuantity
        name={name}
        value={value.text}
        u={u.text}
        unit={textOf(draft.at(`${pointer}/unit`))}
        units={units}
        error={draft.errorAt(...places)}
        onValue={value.onText}
        onU={u.onText}
        onUnit={onUnit ?? ((unit) => draft.set(`${pointer}/unit`, unit))}
      />
    </div>
  );
}

/** A number that stands alone, without uncertainty or unit. */
export function NumberAt({ draft, pointer, name }: { draft: DraftAccess; pointer: string; name: string }) {
  const { text, onText } = useTyped(draft, pointer);
  return (
    <div data-pointer={pointer}>
      <InlineQuantity name={name} value={text} error={draft.errorAt(pointer)} onValue={onText} />
    </div>
  );
}
