import { AllShopsPage } from '../../features/shop/components/all-shops-page.tsx';

export const Component = () => <AllShopsPage />;
