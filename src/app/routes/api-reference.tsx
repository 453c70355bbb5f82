import { ReferencePage } from '../../features/api-reference/reference-page.tsx';

export const Component = () => <ReferencePage />;
