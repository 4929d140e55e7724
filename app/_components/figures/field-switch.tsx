import { Sym } from '../ui/symbols';

interface FieldSwitchProps {
  fields: readonly string[];
  shown: string;
  onShow: (field: string) => void;
  /** Where several fields fit side by side there is nothing to switch. */
  onlyNarrow: boolean;
}

export function FieldSwitch({ fields, shown, onShow, onlyNarrow }: FieldSwitchProps) {
  return (
    <div role="group" aria-label="Field shown" className={`mb-3 flex flex-wrap ${onlyNarrow ? 'figure-switch-narrow' : ''}`}>
      {fields.map((field) => (
        <button
          key={field}
          type="button"
          aria-pressed={field === shown}
          onClick={() => onShow(field)}
          className={`min-h-11 min-w-[52px] cursor-pointer border-b-2 px-3 text-[17px] ${field === shown ? 'border-ink' : 'border-hairline text-graphite'}`}
        >
          <Sym>{field}</Sym>
        </button>
      ))}
    </div>
  );
}
