/** The browser tests drive a product that runs: `npm test -- e2e` starts one and names it, by hand any will do. */
export default function findProduct(): void {
  if (!process.env.QUARTERPOISE_URL) {
    throw new Error('QUARTERPOISE_URL is not set: the address of the running product, as "npm start" prints it');
  }
}
