import { startServices } from './services.js';

export default async function setUp(): Promise<() => Promise<void>> {
  const services = await startServices();
  return () => services.stop();
}
