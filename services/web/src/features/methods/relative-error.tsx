/** "4 × 10⁻¹⁵"; 0 stands for every digit. */
export function RelativeError({ value }: { readonly value: number }) {
  if (value === 0) return '0';
  const [digits = '', exponent = ''] = value.toExponential(0).split('e');
  return (
    <span className="whitespace-nowrap">
      {digits} × 10<sup>{String(Number(exponent)).replace('-', '\u2212')}</sup>
    </span>
  );
}
