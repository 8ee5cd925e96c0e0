import { DesignBasisForm } from '#client/src/features/design-basis/design-basis-form.tsx';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';

export function BasisPage() {
  const project = useProject();
  const mayEdit = useMay('edit-basis');
  return <DesignBasisForm projectId={project.id} basis={project.designBasis} isReadOnly={!mayEdit} />;
}
