declare module 'tz-lookup' {
  /** IANA zone of a place in degrees, north and east positive. Throws where they are out of bounds. */
  export default function lookUpZone(latitudeDeg: number, longitudeDeg: number): string;
}
