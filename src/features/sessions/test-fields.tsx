import type { UseFormReturn } from 'react-hook-form'
import { protocolsWithArms, protocolsWithLoad, usualTest } from '../../../shared/contracts/session-test.ts'
import {
  Arms,
  Protocol,
  protocolNames,
  protocolsFromBox,
  protocolSides,
} from '../../../shared/contracts/tests.ts'
import { SelectField, TextField } from '../../components/field.tsx'
import { parseDecimal } from '../../lib/parse-decimal.ts'
import { armsWords, sideWords } from '../../lib/test-words.ts'
import type { SessionValues } from './session-values.ts'

/** Which test a session does: the protocol, and what this protocol leaves open. */
export function TestFields({ form }: { form: UseFormReturn<SessionValues> }) {
  const { register, setValue, watch, formState } = form
  const errors = formState.errors.test
  const protocol = watch('test.protocol')
  const sides = protocolSides[protocol]
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <SelectField
        label="Test"
        error={errors?.protocol?.message}
        {...register('test.protocol', {
          onChange: () => setValue('test', usualTest(watch('test.protocol')), { shouldDirty: true }),
        })}
      >
        {Protocol.options.map((option) => (
          <option key={option} value={option}>
            {protocolNames[option]}
          </option>
        ))}
      </SelectField>
      {sides.length > 1 && (
        <SelectField label="Side" error={errors?.side?.message} {...register('test.side')}>
          {sides.map((side) => (
            <option key={side} value={side}>
              {sideWords[side]}
            </option>
          ))}
        </SelectField>
      )}
      {protocolsFromBox.includes(protocol) && (
        <TextField
          label="Box, m"
          hint="Its height: 0.3 for 30 cm"
          inputMode="decimal"
          autoComplete="off"
          error={errors?.boxHeightM?.message}
          {...register('test.boxHeightM', { setValueAs: parseDecimal })}
        />
      )}
      {protocolsWithLoad.includes(protocol) && (
        <TextField
          label="Load carried, kg"
          inputMode="decimal"
          autoComplete="off"
          error={errors?.externalLoadKg?.message}
          {...register('test.externalLoadKg', { setValueAs: (typed: unknown) => parseDecimal(typed) ?? 0 })}
        />
      )}
      {protocolsWithArms.includes(protocol) && (
        <SelectField label="Arms" error={errors?.arms?.message} {...register('test.arms')}>
          {Arms.options.map((arms) => (
            <option key={arms} value={arms}>
              {armsWords[arms]}
            </option>
          ))}
        </SelectField>
      )}
    </div>
  )
}
