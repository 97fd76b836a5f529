/**
 * A number as Excel joins it to text: at most 15 significant digits, E notation from 1E+21 on and where more than 20 decimal
 * places would be needed (Excel's behaviour, from memory).
 */
export function excelNumberText(value: number): string {
  const [mantissa, power] = value.toExponential(14).split("e") as [string, string];
  const exponent = Number(power);
  const digits = mantissa.replace("-", "").replace(".", "").replace(/0+$/, "");
  const sign = value < 0 ? "-" : "";
  if (digits === "") return "0";
  const decimals = digits.length - 1 - exponent;
  if (exponent > 20 || decimals > 20) {
    const head = digits.length > 1 ? `${digits[0]}.${digits.slice(1)}` : digits;
    return `${sign}${head}E${exponent < 0 ? "-" : "+"}${String(Math.abs(exponent)).padStart(2, "0")}`;
  }
  if (exponent < 0) return `${sign}0.${"0".repeat(-exponent - 1)}${digits}`;
  if (decimals <= 0) return sign + digits.padEnd(exponent + 1, "0");
  return `${sign}${digits.slice(0, exponent + 1)}.${digits.slice(exponent + 1)}`;
}
