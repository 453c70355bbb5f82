import { BenchPage } from '../../features/bench/components/bench-page.tsx';
import { todayIn } from '../../lib/today.ts';

export const Component = () => <BenchPage today={todayIn()} />;
