import { Button, Stack } from '@chakra-ui/react';
import { useForm } from 'react-hook-form';
import type { SignInRequest } from '../../../shared/api/types.js';
import { FormError } from '../../../shared/ui/form-error.js';
import { showProblem } from '../../../shared/ui/form-problem.js';
import { TextField } from '../../../shared/ui/text-field.js';
import { usePostSignIn } from '../api/post-sign-in.js';

const fieldOf = (field: string): keyof SignInRequest | null =>
  field === 'email' || field === 'passphrase' ? field : null;

export function SignInForm() {
  const signIn = usePostSignIn();
  const { register, handleSubmit, setError, formState } = useForm<SignInRequest>({
    defaultValues: { email: '', passphrase: '' },
  });
  const submit = handleSubmit(async (credentials) => {
    try {
      await signIn.mutateAsync(credentials);
    } catch (error) {
      showProblem(error, setError, fieldOf);
    }
  });
  const { errors, isSubmitting } = formState;
  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <Stack gap="4">
        <TextField
          label="E-mail address"
          type="email"
          autoComplete="username"
          error={errors.email?.message}
          {...register('email', { required: 'Your e-mail address.' })}
        />
        <TextField
          label="Passphrase"
          type="password"
          autoComplete="current-password"
          error={errors.passphrase?.message}
          {...register('passphrase', { required: 'Your passphrase.' })}
        />
        <FormError message={errors.root?.message} />
        <Button type="submit" minH="13" loading={isSubmitting} loadingText="Signing in">
          Sign in
        </Button>
      </Stack>
    </form>
  );
}
