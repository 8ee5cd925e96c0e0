import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { signInSchema } from '#shared/contract/records.ts';
import { placeIssues } from '#client/src/lib/form-issues.ts';
import { Button } from '#client/src/ui/button.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { useSignIn } from './api.ts';

interface SignInFormProps {
  readonly onSignedIn: () => void;
  readonly initialEmail?: string;
}

export function SignInForm({ onSignedIn, initialEmail = '' }: SignInFormProps) {
  const signIn = useSignIn();
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({
    resolver: zodResolver(signInSchema),
    defaultValues: { email: initialEmail, password: '' },
  });
  const { errors } = form.formState;

  const submit = form.handleSubmit(async (values) => {
    setFailure(null);
    try {
      await signIn.mutateAsync(values);
      onSignedIn();
    } catch (error) {
      setFailure(placeIssues(error, form.setError, (path) => path in values));
      form.setFocus('password', { shouldSelect: true });
    }
  });

  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        autoFocus={initialEmail === ''}
        error={errors.email?.message}
        {...form.register('email')}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        autoFocus={initialEmail !== ''}
        error={errors.password?.message}
        {...form.register('password')}
      />
      <FormError message={failure} />
      <div>
        <Button look="solid" type="submit" isBusy={signIn.isPending}>
          Sign in
        </Button>
      </div>
    </form>
  );
}
