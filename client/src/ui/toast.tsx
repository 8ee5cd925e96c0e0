import { Toaster, toast } from 'sonner';

/** Where short notices appear; one per application. */
export function ToastRegion() {
  return (
    <Toaster
      position="bottom-right"
      visibleToasts={3}
      toastOptions={{
        unstyled: true,
        classNames: {
          toast: 'w-full border border-ink bg-sheet text-ink px-4 py-3 flex gap-2 items-baseline text-sm',
          error: 'border-fails! text-fails!',
          actionButton: 'underline ml-auto',
        },
      }}
    />
  );
}

export const notify = {
  done: (text: string) => toast.success(text),
  failed: (text: string) => toast.error(text),
};
