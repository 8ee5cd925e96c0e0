import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { commentInputSchema, type Candidate } from '#shared/contract/records.ts';
import { formatDate } from '#shared/print/format-quantity.ts';
import { placeIssues } from '#client/src/lib/form-issues.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { roleLabel } from '#client/src/lib/state-labels.ts';
import { Button } from '#client/src/ui/button.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { TextAreaField } from '#client/src/ui/text-field.tsx';
import { useUnsavedGuard } from '#client/src/ui/use-unsaved-guard.tsx';
import { useComment } from './api.ts';

export function CommentsPanel({ candidate }: { readonly candidate: Candidate }) {
  const mayComment = useMay('comment');
  return (
    <section aria-label="Comments" className="print:hidden">
      <h2 className="mb-2 font-semibold">Comments</h2>
      {candidate.comments.length === 0 && <p className="text-sm text-muted">None yet.</p>}
      <ol className="grid gap-2">
        {candidate.comments.map((comment) => (
          <li key={comment.id} className="border-t border-rule pt-2 text-sm">
            <span className="flex flex-wrap items-baseline justify-between gap-x-3">
              <span>
                <b className="font-semibold">{comment.author.name}</b>{' '}
                <span className="text-muted">{roleLabel(comment.author.role).toLowerCase()}</span>
              </span>
              <time dateTime={comment.createdAt} className="text-xs text-muted">
                {formatDate(comment.createdAt, true)}
              </time>
            </span>
            <p className="mt-1 break-words whitespace-pre-wrap">{comment.text}</p>
          </li>
        ))}
      </ol>
      {mayComment && <CommentForm candidateId={candidate.id} />}
    </section>
  );
}

function CommentForm({ candidateId }: { readonly candidateId: string }) {
  const comment = useComment(candidateId);
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({ resolver: zodResolver(commentInputSchema), defaultValues: { text: '' } });
  const guard = useUnsavedGuard(form.formState.isDirty);
  const submit = form.handleSubmit(async ({ text }) => {
    setFailure(null);
    try {
      await comment.mutateAsync(text);
      form.reset();
    } catch (error) {
      setFailure(placeIssues(error, form.setError, (path) => path === 'text'));
    }
  });
  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="mt-4 grid gap-3 print:hidden">
      <TextAreaField
        label="Add a comment"
        error={form.formState.errors.text?.message}
        {...form.register('text')}
      />
      <FormError message={failure} />
      <div>
        <Button type="submit" isBusy={comment.isPending}>
          Comment
        </Button>
      </div>
      {guard.element}
    </form>
  );
}
