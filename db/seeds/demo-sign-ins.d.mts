export interface DemoSignIn {
  readonly name: string;
  readonly email: string;
  readonly role: string;
  readonly password: string;
}
export const demoSignIns: readonly DemoSignIn[];
export default demoSignIns;
