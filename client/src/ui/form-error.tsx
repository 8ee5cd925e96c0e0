/** What is wrong with a form as a whole. */
export function FormError({ message }: { readonly message: string | null }) {
  if (message === null || message === '') return null;
  return (
    <p role="alert" className="flex gap-2 border-l-2 border-fails py-1 pl-3 text-sm text-fails">
      {message}
    </p>
  );
}
