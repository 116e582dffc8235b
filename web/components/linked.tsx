import { Link } from 'react-router-dom';

const ADDRESS = /(https?:\/\/[^\s<>"]+[^\s<>".,;:)])/g;

/** Text with its addresses as links; those of this site stay in the page. */
export function Linked({ text }: { text: string }) {
  return (
    text
      .split(ADDRESS)
      // biome-ignore lint/suspicious/noArrayIndexKey: the pieces of one text never move.
      .map((piece, i) => (i % 2 === 0 ? piece : <Address key={`${i} ${piece}`} address={piece} />))
  );
}

function Address({ address }: { address: string }) {
  if (!URL.canParse(address)) return address;
  const { origin, pathname, search, hash } = new URL(address);
  return origin === location.origin ? (
    <Link to={pathname + search + hash}>{address}</Link>
  ) : (
    <a href={address} rel="noreferrer">
      {address}
    </a>
  );
}
