/** The package ships no types; this is the part used here. */
declare module 'zipcodes' {
  export interface ZipCode {
    readonly zip: string;
    readonly latitude: number;
    readonly longitude: number;
    readonly city: string;
    readonly state: string;
    readonly country: string;
  }
  export function lookup(zip: string): ZipCode | undefined;
}
