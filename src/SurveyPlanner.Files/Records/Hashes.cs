using System.Security.Cryptography;

namespace SurveyPlanner.Files.Records;

/// <summary>The hash that inputs, layouts and outputs are known by.</summary>
public static class Hashes
{
    /// <summary>SHA-256 (FIPS 180-4) as 64 lower-case hexadecimal digits, as <c>sha256sum</c> prints it.</summary>
    public static string Sha256(ReadOnlySpan<byte> bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));
}
