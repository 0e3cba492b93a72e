using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Tests.Units;

/// <summary>
/// Unit factors are held against NIST Special Publication 811 (2008), appendix B: foot 0.3048 m, yard 0.9144 m, mile 1609.344 m,
/// nautical mile 1852 m, knot 0.514 444 4 m/s, mile per hour 0.447 04 m/s. Figures from memory of that publication.
/// </summary>
public class QuantityTextTests
{
    private const string Sample = "layout.spacing = \"5 km\"";

    [Theory]
    [InlineData("2.5 km", 2500)]
    [InlineData("2.5km", 2500)]
    [InlineData(" 600 ft ", 182.88)]
    [InlineData("1 nmi", 1852)]
    [InlineData("10 yd", 9.144)]
    [InlineData("1 mi", 1609.344)]
    [InlineData("300 m", 300)]
    [InlineData("1e3 m", 1000)]
    [InlineData("-1 m", -1)]
    [InlineData("5\u00A0km", 5000)]
    public void Lengths_are_read_in_metres(string text, double metres)
        => Assert.Equal(metres, QuantityText.Read(text, UnitTable.Length, Sample).Good, 9);

    [Theory]
    [InlineData("100 kn", 51.44444)]
    [InlineData("36 km/h", 10)]
    [InlineData("3 m/s", 3)]
    [InlineData("100 mph", 44.704)]
    public void Speeds_are_read_in_metres_per_second(string text, double metresPerSecond)
        => Assert.Equal(metresPerSecond, QuantityText.Read(text, UnitTable.Speed, "speed = \"100 kn\"").Good, 5);

    [Theory]
    [InlineData("6 h", 21600)]
    [InlineData("20 min", 1200)]
    [InlineData("45 s", 45)]
    [InlineData("2 day", 172800)]
    public void Times_are_read_in_seconds(string text, double seconds)
        => Assert.Equal(seconds, QuantityText.Read(text, UnitTable.Time, "day = \"6 h\"").Good, 9);

    [Fact]
    public void Money_is_an_amount_and_three_capital_letters()
    {
        Assert.Equal(new Money(480, "EUR"), QuantityText.ReadMoney("480 EUR", "cost = \"480 EUR\"").Good);
        Assert.Contains("three capital letters", QuantityText.ReadMoney("480 euro", "cost = \"480 EUR\"").Complaint);
    }

    [Fact]
    public void A_money_rate_is_money_per_time_length_or_piece()
    {
        Assert.Equal(new MoneyRate(new Money(480, "EUR"), "day"), QuantityText.ReadMoneyRate("480 EUR/day", "cost = \"480 EUR/day\"").Good);
        Assert.Equal(new MoneyRate(new Money(3.5, "NOK"), "km"), QuantityText.ReadMoneyRate("3.5 NOK / km", "cost = \"480 EUR/day\"").Good);
        Assert.Contains("ends in /", QuantityText.ReadMoneyRate("480 EUR/fortnight", "cost = \"480 EUR/day\"").Complaint);
    }

    [Fact]
    public void An_encounter_rate_is_per_kilometre_whatever_length_it_is_given_per()
    {
        const string Rate = "pilot.encounter_rate = \"0.8 /km\"";
        Assert.Equal(new GivenRate(0.8, PerVisit: false), QuantityText.ReadEncounterRate("0.8 /km", Rate).Good);
        Assert.Equal(1.0, QuantityText.ReadEncounterRate("1.852/nmi", Rate).Good.Value, 12);
        Assert.Equal(new GivenRate(1.5, PerVisit: true), QuantityText.ReadEncounterRate("1.5 /visit", Rate).Good);
        Assert.Contains("per length of line", QuantityText.ReadEncounterRate("0.8", Rate).Complaint);
    }

    [Theory]
    [InlineData("5", "write layout.spacing = \"5 km\": a length needs its unit")]
    [InlineData("1,5 km", "\"1,5\" has a comma: the decimal mark is a point, write 1.5")]
    [InlineData("1,500 m", "\"1,500\" has a comma: write 1500, or 1.500 if the comma was the decimal mark")]
    [InlineData("5 nm", "\"nm\" is not a unit of length here: write \"5 nmi\" (the units are m, km, ft, yd, mi or nmi)")]
    [InlineData("5 KM", "\"KM\" is not a unit of length here: write \"5 km\" (the units are m, km, ft, yd, mi or nmi)")]
    [InlineData("5 miles", "\"miles\" is not a unit of length here: write \"5 mi\" (the units are m, km, ft, yd, mi or nmi)")]
    [InlineData("5 cubits", "\"cubits\" is not a unit of length here (the units are m, km, ft, yd, mi or nmi)")]
    [InlineData("km", "\"km\" has no number: write layout.spacing = \"5 km\"")]
    [InlineData("wide", "\"wide\" is not a length: write layout.spacing = \"5 km\"")]
    [InlineData("", "\"\" is not a length: write layout.spacing = \"5 km\"")]
    [InlineData("1e999 km", "\"1e999\" is no finite number")]
    [InlineData("1e308 km", "\"1e308 km\" is no finite number")]
    [InlineData("1.2.3 km", "\"1.2.3\" is not a number")]
    public void What_is_wrong_is_said_in_words(string text, string complaint)
        => Assert.Equal(complaint, QuantityText.Read(text, UnitTable.Length, Sample).Complaint);

    [Fact]
    public void Text_in_messages_cannot_move_the_cursor_or_turn_the_writing()
    {
        Assert.Equal("\"\\u001B[31m\\u202Eabc\\n\"", Quoted.Short("\u001B[31m\u202Eabc\n"));
        Assert.True(Quoted.Short(new string('x', 5000)).Length < 100);
    }
}
