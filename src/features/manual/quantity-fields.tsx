import { useQuery } from '@tanstack/react-query';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import { pagesOfManual } from '#src/api/pages.ts';
import { Field, Select, TextArea } from '#src/ui/field.tsx';
import type { TypedQuantity } from './quantity-form-values.ts';

type Props = { form: UseFormReturn<TypedQuantity>; manualId: string };

export function QuantityFields({ form, manualId }: Props) {
  const { register, control, formState } = form;
  const { errors } = formState;
  const kind = useWatch({ control, name: 'kind' });
  return (
    <>
      <div className="grid gap-x-4 sm:grid-cols-[1fr_2fr]">
        <Field
          label="Symbol"
          className="figures"
          autoComplete="off"
          spellCheck={false}
          error={errors.symbol?.message}
          {...register('symbol')}
        />
        <Field label="Stands for" autoComplete="off" error={errors.label?.message} {...register('label')} />
        <Select label="Kind" error={errors.kind?.message} {...register('kind')}>
          <option value="input">input: set at the bench</option>
          <option value="derived">worked out from others</option>
          <option value="constant">constant of the equipment</option>
        </Select>
        <Field
          label="Unit"
          className="figures"
          autoComplete="off"
          hint="As the manual prints it: mc, kc, mmfd. Empty for a plain number."
          error={errors.unit?.message}
          {...register('unit')}
        />
      </div>
      {kind === 'derived' ? (
        <TextArea
          label="Expression"
          className="figures"
          spellCheck={false}
          hint="Made of other symbols, for instance (carrier - firstIf) / multiplier"
          error={errors.expression?.message}
          {...register('expression')}
        />
      ) : (
        <div className="grid gap-x-4 sm:grid-cols-[1fr_2fr]">
          <Field
            label="Home value"
            className="figures"
            autoComplete="off"
            error={errors.home?.message}
            {...register('home')}
          />
          <label className="mb-3 flex items-center gap-2 sm:mt-6">
            <input type="checkbox" className="size-4 accent-[var(--signal)]" {...register('integer')} />
            Whole numbers only
          </label>
        </div>
      )}
      <PrintedFields form={form} manualId={manualId} />
      <LimitFields form={form} />
    </>
  );
}

function PrintedFields({ form: { register, formState }, manualId }: Props) {
  const { data: pages = [] } = useQuery(pagesOfManual(manualId));
  const { errors } = formState;
  return (
    <div className="grid gap-x-4 sm:grid-cols-3">
      <Field
        label="As printed"
        className="figures"
        autoComplete="off"
        hint="The proof compares with this, to its last digit."
        error={errors.printed?.message}
        {...register('printed')}
      />
      <Select label="On page" error={errors.pageId?.message} {...register('pageId')}>
        <option value="">not said</option>
        {pages.map(({ id, label }) => (
          <option key={id} value={id}>
            {label}
          </option>
        ))}
      </Select>
      <Field
        label="Digits after the point"
        className="figures"
        inputMode="numeric"
        hint="Empty: as many as printed."
        error={errors.decimals?.message}
        {...register('decimals')}
      />
    </div>
  );
}

function LimitFields({ form: { register, control, formState } }: Pick<Props, 'form'>) {
  const toleranceKind = useWatch({ control, name: 'toleranceKind' });
  const { errors } = formState;
  return (
    <details
      className="border-t border-rule pt-2"
      open={toleranceKind !== 'none' || errors.low !== undefined || errors.high !== undefined}
    >
      <summary className="text-signal">Tolerance and limits</summary>
      <div className="mt-2 grid gap-x-4 sm:grid-cols-3">
        <Select label="Tolerance" {...register('toleranceKind')}>
          <option value="none">none</option>
          <option value="absolute">in its unit</option>
          <option value="percent">per cent</option>
          <option value="ppm">parts per million</option>
        </Select>
        <Field
          label="Plus"
          className="figures"
          disabled={toleranceKind === 'none'}
          error={errors.plus?.message}
          {...register('plus')}
        />
        <Field
          label="Minus"
          className="figures"
          disabled={toleranceKind === 'none'}
          hint="Empty: the same as plus."
          error={errors.minus?.message}
          {...register('minus')}
        />
        <Field label="Not below" className="figures" error={errors.low?.message} {...register('low')} />
        <Field label="Not above" className="figures" error={errors.high?.message} {...register('high')} />
      </div>
    </details>
  );
}
