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

/** What can still be done about it, one word on a button. */
interface NoticeAction {
  readonly words: string;
  readonly act: () => void;
}

export const notify = {
  done: (text: string, action?: NoticeAction) =>
    toast.success(text, action && { action: { label: action.words, onClick: action.act } }),
  failed: (text: string) => toast.error(text),
};
