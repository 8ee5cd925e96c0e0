import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm, type DefaultValues } from 'react-hook-form';
import { beamInputSchema, type Beam, type BeamInput } from '#shared/contract/records.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { placeIssues } from '#client/src/lib/form-issues.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { Button } from '#client/src/ui/button.tsx';
import { Dialog } from '#client/src/ui/dialog.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { FormNumberField } from '#client/src/ui/form-number-field.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { useUnsavedGuard } from '#client/src/ui/use-unsaved-guard.tsx';
import { useSaveBeam } from './api.ts';

interface BeamDialogProps {
  /** Null for a new one. */
  readonly beam: Beam | null;
  readonly onClose: () => void;
}

const EMPTY: DefaultValues<BeamInput> = {
  mark: '',
  location: '',
  count: 1,
  vuN: null,
  ductilityTarget: null,
  depthCapMm: null,
};

export function BeamDialog({ beam, onClose }: BeamDialogProps) {
  const { id: projectId, designBasis } = useProject();
  const { units } = designBasis;
  const symbols = codeSymbols(designBasis.ruleSet);
  const save = useSaveBeam(projectId, beam?.id ?? null);
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm<BeamInput>({
    resolver: zodResolver(beamInputSchema),
    defaultValues: beam === null ? EMPTY : beamInputSchema.parse(beam),
  });
  const { control, register } = form;
  const { errors, isDirty } = form.formState;
  const guard = useUnsavedGuard(isDirty);

  const submit = form.handleSubmit(async (values) => {
    setFailure(null);
    try {
      await save.mutateAsync(values);
      guard.release();
      onClose();
    } catch (error) {
      setFailure(placeIssues(error, form.setError, (path) => path in beamInputSchema.shape));
    }
  });

  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={beam === null ? 'New beam' : `Beam ${beam.mark}`}
      description="Factored demands at the section to be designed."
      isWide
      isSticky={isDirty}
    >
      <form onSubmit={(event) => void submit(event)} noValidate>
        <div className="grid gap-x-8 gap-y-4 sm:grid-cols-2">
          <TextField label="Mark" error={errors.mark?.message} autoFocus {...register('mark')} />
          <TextField
            label="Location"
            hint="Floor, grid line, midspan or support. May stay empty."
            error={errors.location?.message}
            {...register('location')}
          />
          <FormNumberField control={control} name="spanMm" kind="span" units={units} label="Span" />
          <FormNumberField
            control={control}
            name="count"
            kind="count"
            units={units}
            label="Count"
            hint="Equal beams this section is for."
          />
          <FormNumberField
            control={control}
            name="muNmm"
            kind="moment"
            units={units}
            label={`Moment ${symbols.moment}`}
            hint="The largest that the section must carry, sagging or hogging."
          />
          <FormNumberField
            control={control}
            name="vuN"
            kind="force"
            units={units}
            label={`Shear ${symbols.shear}`}
            hint="Kept with the beam; empty if not known yet."
          />
          <FormNumberField
            control={control}
            name="ductilityTarget"
            kind="ratio"
            units={units}
            label="Ductility target μφ"
            hint="Least curvature at ultimate over curvature at yield. Empty: not asked."
          />
          <FormNumberField
            control={control}
            name="depthCapMm"
            kind="length"
            units={units}
            label="Depth cap"
            hint="Largest overall depth h. Empty: not asked."
          />
        </div>
        <div className="mt-5 flex flex-wrap items-center gap-3">
          <Button look="solid" type="submit" isBusy={save.isPending}>
            {beam === null ? 'Add beam' : 'Save beam'}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
          <FormError message={failure} />
        </div>
      </form>
      {guard.element}
    </Dialog>
  );
}
