export { BenchScreen as default } from '../shared/screens/bench/bench-screen';
