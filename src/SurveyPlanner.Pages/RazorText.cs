using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Web;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Logging.Abstractions;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages;

/// <summary>Renders a component to text.</summary>
internal static class RazorText
{
    public static string Render<TComponent>(Dictionary<string, object?> parameters)
        where TComponent : IComponent
        => PlainText.SettleReferences(RenderAsync<TComponent>(ParameterView.FromDictionary(parameters)).GetAwaiter().GetResult());

    // Nothing in the pages waits for anything: the task is finished when it is returned.
    private static async Task<string> RenderAsync<TComponent>(ParameterView parameters)
        where TComponent : IComponent
    {
        await using var services = new ServiceCollection().BuildServiceProvider();
        await using var renderer = new HtmlRenderer(services, NullLoggerFactory.Instance);
        return await renderer.Dispatcher.InvokeAsync(async () => (await renderer.RenderComponentAsync<TComponent>(parameters)).ToHtmlString());
    }
}
